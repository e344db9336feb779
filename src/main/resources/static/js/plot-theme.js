// The colours and type of the page, read from its style sheet so that dark and light follow.

export function theme() {
  const style = getComputedStyle(document.documentElement);
  const colour = (name) => style.getPropertyValue(name).trim();
  return {
    ink: colour("--ink"),
    faint: colour("--faint"),
    rule: colour("--rule"),
    sheet: colour("--sheet"),
    accent: colour("--accent"),
    signal: colour("--signal"),
    font: getComputedStyle(document.body).fontFamily,
  };
}
