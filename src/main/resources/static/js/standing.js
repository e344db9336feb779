// Keeps the captures on a page up to date while they are being measured.

const PAUSE_MS = 1000;

async function follow(item) {
  try {
    const answer = await fetch(item.dataset.progress, { headers: { Accept: "application/json" } });
    if (answer.ok) {
      const now = await answer.json();
      if (now.over) {
        await finish(item);
        return;
      }
      const percent = Math.round(100 * now.progress);
      item.querySelector("progress").value = percent;
      const words = item.querySelector("[data-text]");
      words.textContent = words.dataset.text.replace("{}", percent);
    }
  } catch {
    // the service may be starting again: ask later
  }
  setTimeout(() => follow(item), PAUSE_MS);
}

/** Puts the result, and what is to be done now, in place without touching what may be half entered beside them. */
async function finish(item) {
  const answer = await fetch(location.href, { headers: { Accept: "text/html" } });
  const fresh = new DOMParser().parseFromString(await answer.text(), "text/html");
  const result = fresh.querySelector(`[data-capture="${item.dataset.capture}"]`);
  if (result && document.querySelector("form.upload")) {
    item.replaceWith(document.importNode(result, true));
    const next = fresh.querySelector("[data-next]");
    if (next) {
      document.querySelector("[data-next]")?.replaceWith(document.importNode(next, true));
    }
  } else {
    location.reload();
  }
}

document.querySelectorAll(".item[data-progress]").forEach(follow);
