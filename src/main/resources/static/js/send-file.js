// Sends one file straight into the store, with what the form says about it.

const SAID = ["speedSettingId", "condition", "instrumentId", "mediumId", "toneMethod"];

/** Resolves to the answer of the service; rejects with its sentence, or an empty one. */
export function sendFile(address, said, file, onProgress) {
  const query = new URLSearchParams({ fileName: file.name });
  for (const name of SAID) {
    if (said.get(name)) {
      query.set(name, said.get(name));
    }
  }
  return new Promise((stored, failed) => {
    const request = new XMLHttpRequest();
    request.open("POST", `${address}?${query}`);
    request.setRequestHeader("Content-Type", "application/octet-stream");
    request.setRequestHeader("Accept", "application/json");
    request.setRequestHeader("X-CSRF-TOKEN", said.get("_csrf") ?? "");
    request.upload.onprogress = (event) => onProgress(event.total > 0 ? event.loaded / event.total : 0);
    request.onload = () => {
      if (request.status === 201) {
        stored(JSON.parse(request.responseText));
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
