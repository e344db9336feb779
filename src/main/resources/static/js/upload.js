// Sends the files of an upload form one after the other, straight into the store, with progress.
for (const form of document.querySelectorAll("form.upload")) {
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

  function put(file, said) {
    const query = new URLSearchParams({ fileName: file.name });
    for (const name of ["speedSettingId", "condition", "instrumentId", "mediumId", "toneMethod"]) {
      if (said.get(name)) {
        query.set(name, said.get(name));
      }
    }
    bar.hidden = false;
    bar.value = 0;
    words.className = "";
    return new Promise((stored, failed) => {
      const request = new XMLHttpRequest();
      request.open("POST", `${form.action}?${query}`);
      request.setRequestHeader("Content-Type", "application/octet-stream");
      request.setRequestHeader("Accept", "application/json");
      request.setRequestHeader("X-CSRF-TOKEN", said.get("_csrf") ?? "");
      request.upload.onprogress = (event) => {
        bar.value = event.total > 0 ? event.loaded / event.total : 0;
        const percent = Math.round(100 * bar.value);
        words.textContent =
          percent < 100 ? `${shown.dataset.sending} ${file.name}: ${percent} %` : `${shown.dataset.storing} ${file.name}`;
      };
      request.onload = () => {
        if (request.status === 201) {
          stored(JSON.parse(request.responseText).page);
        } else {
          failed(new Error(sentence(request.responseText)));
        }
      };
      request.onerror = () => failed(new Error(""));
      request.send(file);
    });
  }

  function sentence(body) {
    try {
      return JSON.parse(body).detail ?? "";
    } catch {
      return "";
    }
  }
}
