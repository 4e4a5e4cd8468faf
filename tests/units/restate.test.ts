import { expect, test } from 'vitest'
import { restated } from '#units/restate.ts'

const nbsp = '\u00a0'

test('in SI the words stay and numbers keep their units on one line', () => {
  expect(restated('Touch: 40 mm gives 52.1 °C against 55 °C.', 'si')).toBe(
    `Touch: 40${nbsp}mm gives 52.1${nbsp}°C against 55${nbsp}°C.`,
  )
})

// 1150 W/m x 3.412 142 Btu/h per W x 0.3048 m per ft = 1196.02 Btu/h·ft (NIST SP 811: 1 Btu/h = 0.293 071 1 W).
// 40 mm = 1.5748 in and 60 mm = 2.3622 in (1 in = 25.4 mm exactly); 55 °C = 131 °F; 1 K = 1.8 °F.
// 7 bar = 101.53 psi (NIST SP 811: 1 psi = 6.894 757 kPa).
// 1 m²K/W = 5.678 263 h·ft²·°F/Btu and 4186.8 J/(kg·K) = 1 Btu/(lb·°F) (NIST SP 811, B.8); 1 m² = 10.763 9 ft²;
// 1 kg/s = 7936.64 lb/h and 10 kg/h = 22.05 lb/h (1 lb = 0.453 592 37 kg).
test.each([
  ['40 mm gives 55 °C', `1.57${nbsp}in gives 131.0${nbsp}°F`],
  ['40 and 60 mm cost about the same', `1.57${nbsp}in and 2.36${nbsp}in cost about the same`],
  ['the air is −40 °C', `the air is −40.0${nbsp}°F`],
  ['3.2 K above the dew point', `5.8${nbsp}°F above the dew point`],
  ['Steam of 7 bar g', `Steam of 101.5${nbsp}psi g`],
  ['2 m²K/W without films', `11.36${nbsp}h·ft²°F/Btu without films`],
  ['a heat capacity of 4187 J/kgK', `a heat capacity of 1.000${nbsp}Btu/lb°F`],
  ['1 m² of bare surface', `10.8${nbsp}ft² of bare surface`],
  ['1 kg/s flow', `7${'\u202f'}937${nbsp}lb/h flow`],
  ['10 kg/h of steam', `22.0${nbsp}lb/h of steam`],
  ['1 150 W/m', `1${'\u202f'}196.0${nbsp}Btu/h·ft`],
])('in US units %s is %s', (written, read) => {
  expect(restated(written.replace('1 150', '1\u202f150'), 'us')).toBe(read)
})

test('numbers without a unit of ours stay as they are', () => {
  const text = 'DN 80 over 15 years at 5 s costs within 2 % of it, 143.20 per m'
  expect(restated(text, 'us')).toBe(text)
})
