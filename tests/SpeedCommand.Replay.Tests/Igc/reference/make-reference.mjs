// What an independent reader makes of the IGC files here: npm package igc-parser 2.0.0 (MIT), run with
//   npm install igc-parser@2.0.0 && node make-reference.mjs
import { readFileSync, writeFileSync } from 'fs'
import parser from 'igc-parser'

for (const name of ['flight', 'written']) {
  const parsed = parser.parse(readFileSync(`${name}.igc`, 'utf8'))
  const fixes = parsed.fixes.map(fix => ({
    timestamp: fix.timestamp, latitude: fix.latitude, longitude: fix.longitude, valid: fix.valid,
    pressureAltitude: fix.pressureAltitude, gpsAltitude: fix.gpsAltitude, extensions: fix.extensions, enl: fix.enl,
  }))
  const header = { date: parsed.date, pilot: parsed.pilot, gliderType: parsed.gliderType, registration: parsed.registration, security: parsed.security }
  writeFileSync(`${name}.igc-parser.json`, JSON.stringify({ header, fixes }, null, 0).replaceAll('},{"timestamp', '},\n{"timestamp') + '\n')
}
