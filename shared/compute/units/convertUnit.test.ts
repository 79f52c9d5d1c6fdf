import fc from 'fast-check'
import { expect, it } from 'vitest'
import { convertUnit } from './convertUnit'
import { readUnit } from './readUnit'

it.each([
  [1, 'yd3', 'm3', 0.764554857984],
  [1, 'US short ton', 'kg', 907.18474],
  [1, 'long ton', 'kg', 1016.0469088],
  [1, 'lb/ft2', 'kg/m2', 4.88242763638305],
  [1, 'square feet', 'm²', 0.09290304],
  [1, 'acre', 'm2', 4046.8564224],
  [1, 'ha', 'm2', 10_000],
  [1, 'US gallons', 'L', 3.785411784],
  [1, 'cubic yards', 'cu ft', 27],
  [1, 'tonnes', 'short tons', 1.1023113109243878],
  [1, 'kg/m3', 't/m3', 0.001],
  [1, 'pounds per cubic foot', 'kg/m^3', 16.01846337396014],
  [1, 'kWh/m2', 'MJ/m2', 3.6],
  [1, 'feet', 'inches', 12],
  [1, 'mi', 'km', 1.609344],
])('%d %s is so many %s', (value, from, to, expected) => {
  expect(convertUnit(value, from, to) / expected).toBeCloseTo(1, 12)
})

it('comes back to the value it started from', () => {
  const units = fc.constantFrom('kg/m3', 'lb/yd3', 'lb/ft3', 't/m3', 'short ton/yd3')
  fc.assert(
    fc.property(fc.double({ min: -1e9, max: 1e9, noNaN: true }), units, units, (value, from, to) => {
      const back = convertUnit(convertUnit(value, from, to), to, from)

      expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-12 * Math.abs(value) + 1e-300)
    }),
  )
})

it('refuses unlike units, unknown units, and what is no number', () => {
  expect(() => convertUnit(1, 'ft2', 'm3')).toThrow('unit-mismatch')
  expect(() => convertUnit(1, 'kg/m2', 'kg')).toThrow('unit-mismatch')
  expect(() => readUnit('furlong')).toThrow('unknown-code')
  expect(() => convertUnit(Number.NaN, 'm', 'ft')).toThrow('not-a-number')
})
