"use strict";
// The controls, where the service lets the page change them: one line a touch, what became of it, and how each stands.
// page.js, which is read next, has $ and put, and says when a frame came and when there is none.

const SET_MS = 8000;        // without a touch: what covers the numbers must go by itself
const ANSWER_MS = 4000;     // time to read why not
const PATIENCE_MS = 2000;   // a touch that could not be sent by then is not sent: nobody expects it any more

const buttons = [...document.querySelectorAll(".control button")];
let moment = "";            // what was changed just now, by any hand
let refusal = "";
let refusedAt = -Infinity;
let touchedAt = -Infinity;
let sending = Promise.resolve();

const nameOf = button => button.dataset.name ?? button.parentElement.dataset.name;

function allow(isAllowed) {
  document.body.toggleAttribute("data-open", isAllowed);
  $("set").hidden = !isAllowed;
  if (!isAllowed) closeSet();
}

function showControls(controls) {
  allow(controls.open);
  moment = controls.moment;
  showWords();
  for (const stand of controls.stand) {
    const text = document.querySelector(`.control[data-name="${stand.name}"] .stands`);
    if (text && text.textContent !== stand.text) text.textContent = stand.text;
    for (const button of buttons.filter(one => nameOf(one) === stand.name)) {
      button.setAttribute("aria-pressed", button.dataset.value === stand.word);
    }
  }
}

function hideControls() {
  moment = "";
  showWords();
  allow(false);
}

function showWords() {
  put("moment", moment);
  put("answer", performance.now() - refusedAt < ANSWER_MS ? "! " + refusal : moment);
}

function touch() {
  touchedAt = performance.now();
}

function openSet() {
  touch();
  document.body.dataset.set = "";
  put("set", "Done");
}

function closeSet() {
  delete document.body.dataset.set;
  refusedAt = -Infinity;
  put("set", "Set");
}

// What was done, the next frame says by itself; what was not, is said here.
async function send(line, askedAt) {
  try {
    if (performance.now() - askedAt > PATIENCE_MS) throw new Error();
    const answer = await fetch("set", {
      method: "POST", headers: { "X-SpeedCommand": "set" }, body: line, signal: AbortSignal.timeout(PATIENCE_MS),
    });
    const text = (await answer.text()).trim();
    refusal = answer.ok ? "" : text || "refused: " + answer.status;
  } catch {
    refusal = line + ": no answer from the service";
  }
  refusedAt = refusal ? performance.now() : -Infinity;
  showWords();
}

for (const button of buttons) {
  button.type = "button";
  button.addEventListener("click", () => {
    const askedAt = performance.now();
    sending = sending.then(() => send(`${nameOf(button)} ${button.dataset.value}`, askedAt));
  });
}

document.getElementById("set").addEventListener("click", () => "set" in document.body.dataset ? closeSet() : openSet());
document.addEventListener("pointerdown", touch);
setInterval(() => { if (performance.now() - touchedAt > SET_MS) closeSet(); }, 250);
