"use strict";
// Shows what the service sends, and nothing of its own: every number comes as text. What the page does by itself is to blank them.

const STROKES = 8;          // on each side of the bar; the service counts them out
const OLD_MS = 700;         // a frame older than this is not true any more; one comes every 200 ms
const CHECK_MS = 100;       // so nothing stands longer than OLD_MS + CHECK_MS
const CAUTION_MS = 2500;
const DRIFT = 5e-4;         // how far two clocks may run apart: far more than any quartz, far less than OLD_MS in a minute

const $ = id => document.getElementById(id);
let least = Infinity;       // arrival minus sending of the quickest frame: the difference of the two clocks
let leastAt = 0;
let madeAt = -Infinity;     // when the newest frame was sent, by the page's clock
let isBlank = false;

function put(id, text) {
  const element = $(id);
  if (element.textContent !== text) element.textContent = text;
}

function addSpan(parent, name) {
  const span = parent.appendChild(document.createElement("span"));
  span.className = name;
  return span;
}

for (const side of ["slower", "faster"]) {
  for (let i = 0; i < STROKES; i++) $(side).appendChild(document.createElement("i"));
}

function showTurn(turn) {
  $("turn").dataset.way = turn.way;
  $("turn").classList.toggle("doubtful", turn.doubtful);
  for (const side of ["slower", "faster"]) {
    const count = side === turn.way ? turn.strokes : 0;
    [...$(side).children].forEach((stroke, i) => {
      stroke.classList.toggle("lit", i < count);
      stroke.classList.toggle("head", turn.beyond && i === count - 1);
    });
    put(side + "Words", side === turn.way ? turn.words : "");
  }
  put("onWords", turn.way === "on" || turn.way === "unknown" ? turn.words : "");
}

function showReasons(reasons) {
  const parent = $("reasons");
  while (parent.children.length < reasons.length) {
    const row = parent.appendChild(document.createElement("div"));
    for (const name of ["label", "number", "unit", "plus"]) addSpan(row, name);
  }
  reasons.forEach((reason, i) => {
    const row = parent.children[i];
    row.className = "reason" + (reason.strong ? " strong" : "") + (reason.held ? " held" : "");
    const texts = [reason.label, reason.text, reason.unit, reason.sigma];
    texts.forEach((text, j) => { if (row.children[j].textContent !== text) row.children[j].textContent = text; });
    row.children[1].classList.toggle("doubtful", reason.doubtful || !reason.known);
  });
}

function show(frame) {
  isBlank = false;
  document.body.dataset.phase = frame.phase;
  put("phase", frame.phase.toUpperCase());
  put("time", frame.time);
  put("speed", frame.hold.text);
  $("speed").classList.toggle("doubtful", frame.hold.doubtful || !frame.hold.known);
  $("speed").classList.toggle("wide", frame.hold.text.length > 3);
  put("unit", frame.hold.unit + " to hold");
  put("source", frame.hold.source);
  put("sigma", frame.hold.sigma);
  put("limit", frame.hold.limit);
  put("flying", `flying ${frame.flying.text} ${frame.flying.unit}`);
  showTurn(frame.turn);
  showReasons(frame.reasons);
  $("faults").classList.toggle("wrong", frame.faults.length > 0);
  put("faults", frame.faults.length > 0 ? "! " + frame.faults.join(", ") : "no faults");
  showControls(frame.controls);
}

function blank(words) {
  if (!isBlank) {
    isBlank = true;
    document.body.dataset.phase = "none";
    put("phase", "NO DATA");
    put("speed", "--");
    $("speed").className = "doubtful";
    for (const id of ["time", "sigma", "limit", "flying", "source"]) put(id, "");
    showTurn({ way: "unknown", words: "--", strokes: 0, beyond: false, doubtful: false });
    for (const row of $("reasons").children) {
      row.children[1].textContent = "--";
      row.children[1].classList.add("doubtful");
      row.children[3].textContent = "";
    }
    $("faults").classList.add("wrong");
    hideControls();
  }
  put("faults", words);
}

function take(frame) {
  const now = performance.now();
  const under = now - frame.at;
  // The clocks drift; the least is allowed to, or hours later every frame would seem late.
  least = Math.min(least + (now - leastAt) * DRIFT, under);
  leastAt = now;
  madeAt = Math.max(madeAt, frame.at + least);
  if (now - madeAt <= OLD_MS) show(frame);
}

function check() {
  const age = performance.now() - madeAt;
  if (age > OLD_MS) blank(madeAt === -Infinity ? "! no data yet" : `! no data for ${Math.floor(age / 1000)} s: nothing shown is true`);
}

function setLook(look) {
  document.documentElement.dataset.look = look;
  put("look", look === "day" ? "night" : "day");
}

function remembered(look) {
  try {
    if (look) localStorage.setItem("look", look);
    return localStorage.getItem("look");
  } catch {
    return null; // A browser that keeps nothing follows the system's look.
  }
}

const bright = matchMedia("(prefers-color-scheme: light)");
const follow = () => setLook(remembered() ?? (bright.matches ? "day" : "night"));
bright.addEventListener("change", follow);
$("look").addEventListener("click", () => setLook(remembered($("look").textContent) ?? $("look").textContent));
follow();

const events = new EventSource("events");
events.onopen = () => { least = Infinity; };
events.onmessage = event => take(JSON.parse(event.data));
events.onerror = () => { madeAt = Math.min(madeAt, performance.now() - OLD_MS - 1); check(); };
check();
setInterval(check, CHECK_MS);
document.addEventListener("visibilitychange", check);
setTimeout(() => { $("caution").hidden = true; }, CAUTION_MS);
