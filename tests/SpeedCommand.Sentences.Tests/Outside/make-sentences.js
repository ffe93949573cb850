// Writes sentences.txt with another program's help, nmea-simple 3.3.0 of the npm registry:
//   npm install nmea-simple@3.3.0 && node make-sentences.js > sentences.txt
// GGA and VTG lines are written by it, after the values it was given. RMC lines are composed here, after the values that it reads.
const nmea = require("nmea-simple");

let state = 20260614;
const random = (from, to) => {
  state = (Math.imul(state, 1664525) + 1013904223) >>> 0; // Numerical Recipes' generator: the same lines each time
  return from + (to - from) * (state / 2 ** 32);
};
const round = (value, digits) => Number(value.toFixed(digits));
const pick = (values) => values[Math.floor(random(0, values.length))];
const two = (value) => String(Math.floor(value)).padStart(2, "0");
const put = (values, line) => console.log([...values, line.trim()].join(" "));
const talkers = ["GP", "GN", "GL", "GA", "II"];

for (let i = 0; i < 100; i++) {
  const time = new Date(2026, 5, 14, random(0, 24), random(0, 60), random(0, 60));
  const gga = {
    sentenceId: "GGA", time, latitude: round(random(-90, 90), 6), longitude: round(random(-180, 180), 6), fixType: pick(["fix", "delta", "rtk"]),
    satellitesInView: Math.floor(random(4, 30)), horizontalDilution: round(random(0.5, 9), 1),
    altitudeMeters: round(random(-50, 9000), 1), geoidalSeperation: round(random(-100, 80), 1),
  };
  put([gga.latitude, gga.longitude, gga.altitudeMeters, gga.geoidalSeperation], nmea.encodeNmeaPacket(gga, pick(talkers)));

  const knots = round(random(0, 150), 2);
  const vtg = {
    sentenceId: "VTG", trackTrue: round(random(0, 360), 1), trackMagnetic: round(random(0, 360), 1), speedKnots: knots,
    speedKmph: i % 3 === 0 ? undefined : round(knots * 1.852, 2), faaMode: i % 2 === 0 ? "A" : undefined,
  };
  put([vtg.trackTrue, vtg.speedKnots], nmea.encodeNmeaPacket(vtg, pick(talkers)));

  const minutes = () => random(0, 59.9999).toFixed(4).padStart(7, "0");
  const content = [
    pick(talkers) + "RMC", `${two(random(0, 24))}${two(random(0, 60))}${two(random(0, 60))}.${two(random(0, 100))}`, "A",
    two(random(0, 90)) + minutes(), pick(["N", "S"]), String(Math.floor(random(0, 180))).padStart(3, "0") + minutes(), pick(["E", "W"]),
    random(0, 150).toFixed(2), random(0, 360).toFixed(1), `${two(random(1, 29))}${two(random(1, 13))}${two(random(0, 40))}`, "", "",
    ...pick([[], ["A"], ["D", "V"], ["R", "S"]]),
  ].join(",");
  const sum = [...content].reduce((all, one) => all ^ one.charCodeAt(0), 0).toString(16).toUpperCase().padStart(2, "0");
  const read = nmea.parseNmeaSentence(`$${content}*${sum}`);
  put([read.datetime.getTime() / 1000, read.latitude, read.longitude, read.speedKnots, read.trackTrue], `$${content}*${sum}`);
}
