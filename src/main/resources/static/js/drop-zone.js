// Several files at once: each is sent with its own progress, then the page of the visit asks to confirm.
import { sendFile } from "./send-file.js";

for (const form of document.querySelectorAll("form.upload.zone")) {
  const input = form.querySelector("input[type=file]");
  const button = form.querySelector("button");
  const list = form.querySelector(".upload-list");
  const on = form.querySelector("[data-on]");
  const place = form.closest(".bring") ?? form;

  form.addEventListener("submit", (event) => {
    event.preventDefault();
    if (form.reportValidity()) {
      sendAll([...input.files]);
    }
  });
  place.addEventListener("dragover", (event) => {
    event.preventDefault();
    place.classList.add("dropping");
  });
  place.addEventListener("dragleave", () => place.classList.remove("dropping"));
  place.addEventListener("drop", (event) => {
    event.preventDefault();
    place.classList.remove("dropping");
    if (event.dataTransfer.files.length > 0) {
      input.files = event.dataTransfer.files;
      form.requestSubmit();
    }
  });

  async function sendAll(files) {
    const said = new FormData(form);
    const lines = files.map(line);
    button.disabled = true;
    list.replaceChildren(...lines.map((one) => one.item));
    list.hidden = false;
    let visit = "";
    let broken = 0;
    for (const [at, file] of files.entries()) {
      try {
        const answer = await sendFile(form.action, said, file, (share) => lines[at].sent(share));
        visit = answer.visit;
        lines[at].done(answer.refusal ?? answer.format, answer.refusal !== null);
      } catch (problem) {
        broken++;
        lines[at].done(problem.message || list.dataset.broken, true);
      }
    }
    button.disabled = false;
    if (visit && broken === 0) {
      location.assign(visit);
    } else if (visit) {
      on.querySelector("a").href = visit; // what did not arrive can be read first
      on.hidden = false;
    }
  }

  function line(file) {
    const item = document.createElement("li");
    const name = document.createElement("span");
    const bar = document.createElement("progress");
    const words = document.createElement("small");
    name.className = "file-name";
    name.textContent = file.name;
    bar.max = 1;
    bar.value = 0;
    bar.setAttribute("aria-label", file.name);
    words.textContent = list.dataset.waiting;
    item.append(name, bar, words);
    return {
      item,
      sent(share) {
        bar.value = share;
        words.textContent = share < 1 ? `${list.dataset.sending} ${Math.round(100 * share)} %` : list.dataset.storing;
      },
      done(text, refused) {
        bar.value = 1;
        words.textContent = text;
        words.className = refused ? "error" : "";
      },
    };
  }
}
