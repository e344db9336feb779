// Follows a measurement and goes on to what comes of it.
const place = document.querySelector("[data-progress]");
const bar = place?.querySelector("progress");
const words = place?.querySelector("[role=status]");

async function ask() {
  try {
    const answer = await fetch(place.dataset.progress, { headers: { Accept: "application/json" } });
    if (answer.ok) {
      const now = await answer.json();
      if (now.over) {
        if (now.state === "measured") {
          location.replace(place.dataset.reading);
        } else {
          location.reload();
        }
        return;
      }
      bar.value = now.progress;
      const said = now.message || (now.jobState === "running" ? words.dataset.measuring : words.dataset.waiting);
      if (words.textContent !== said) {
        words.textContent = said;
      }
    }
  } catch {
    // the service may be starting again: ask later
  }
  setTimeout(ask, 700);
}

if (place) {
  ask();
}
