// Sends the files of an upload form one after the other, straight into the store, with progress.
import { sendFile } from "./send-file.js";

for (const form of document.querySelectorAll("form.upload:not(.zone)")) {
  const input = form.querySelector("input[type=file]");
  const button = form.querySelector("button");
  const shown = form.querySelector(".upload-progress");
  const bar = shown.querySelector("progress");
  const words = shown.querySelector("span");
  const cell = form.closest("[data-drop]") ?? form;

  form.addEventListener("submit", (event) => {
    event.preventDefault();
    if (form.reportValidity()) {
      send([...input.files]);
    }
  });
  cell.addEventListener("dragover", (event) => {
    event.preventDefault();
    cell.classList.add("dropping");
  });
  cell.addEventListener("dragleave", () => cell.classList.remove("dropping"));
  cell.addEventListener("drop", (event) => {
    event.preventDefault();
    cell.classList.remove("dropping");
    if (event.dataTransfer.files.length > 0) {
      const folded = form.closest("details");
      if (folded) folded.open = true; // what follows must be seen
      input.files = event.dataTransfer.files;
      form.requestSubmit();
    }
  });

  async function send(files) {
    const said = new FormData(form);
    button.disabled = true;
    shown.hidden = false;
    let page = "";
    try {
      for (const file of files) {
        page = await put(file, said);
      }
      location.assign(files.length === 1 ? page : form.action.replace(/\/captures$/, ""));
    } catch (problem) {
      bar.hidden = true;
      words.textContent = problem.message || shown.dataset.broken;
      words.className = "error";
      button.disabled = false;
    }
  }

  async function put(file, said) {
    bar.hidden = false;
    bar.value = 0;
    words.className = "";
    const answer = await sendFile(form.action, said, file, (share) => {
      bar.value = share;
      const percent = Math.round(100 * share);
      words.textContent =
        percent < 100 ? `${shown.dataset.sending} ${file.name}: ${percent} %` : `${shown.dataset.storing} ${file.name}`;
    });
    return answer.page;
  }
}
