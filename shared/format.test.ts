import { describe, expect, it } from 'vitest'
import {
  formatArea,
  formatBytes,
  formatCount,
  formatDate,
  formatDecimal,
  formatDistance,
  formatMass,
  formatMassFigure,
  formatMassRange,
  formatRange,
  formatShare,
  formatVolume,
  formatYearRange,
  massUnitFor,
} from './format'

/** Unbroken spaces read as plain ones, so that the expectations can be typed. */
const plain = (text: string): string => text.replace(/[\u00a0\u202f]/g, ' ')

describe('formatMass', () => {
  it.each([
    [0, '0 kg'],
    [0.4, '0.4 kg'],
    [860.4, '860 kg'],
    [2_700, '2.7 t'],
    [48_000, '48 t'],
    [18_432_000, '18,400 t'],
    [99_900_000, '99,900 t'],
    [184_320_000, '184 kt'],
    [2.5e11, '250 Mt'],
    [-5_000, '-5 t'],
  ])('writes %d kg in three significant digits and a fitting unit', (massKg, text) => {
    expect(plain(formatMass(massKg, 'en'))).toBe(text)
  })

  it('writes in the unit asked for and in the separators of the language', () => {
    expect(plain(formatMass(460_000, 'de', 'kt'))).toBe('0,46 kt')
    expect(plain(formatMass(18_432_000, 'de'))).toBe('18.400 t')
  })

  it('writes a dash for what is no figure', () => {
    expect(formatMass(Number.NaN, 'en')).toBe('–')
    expect(formatMassFigure(Number.POSITIVE_INFINITY, 'en', 't')).toBe('–')
  })
})

describe('massUnitFor', () => {
  it('chooses one unit for a column by its largest mass', () => {
    expect(massUnitFor([10_700_000, 4_000, Number.NaN])).toBe('t')
    expect(massUnitFor([999])).toBe('kg')
    expect(massUnitFor([])).toBe('kg')
  })
})

describe('formatRange', () => {
  it('writes the unit once, chosen by the high end', () => {
    expect(plain(formatMassRange(1_900_000, 3_600_000, 'en'))).toBe('1,900 – 3,600 t')
    expect(plain(formatMassRange(400, 3_600, 'en'))).toBe('0.4 – 3.6 t')
  })

  it('writes equal ends once', () => {
    expect(formatRange(3, 3, (value) => formatCount(value, 'en'))).toBe('3')
    expect(formatYearRange(2031, 2031)).toBe('2031')
  })

  it('writes years without separators', () => {
    expect(formatYearRange(2027, 2036)).toBe('2027–2036')
  })
})

describe('quantities', () => {
  it.each([
    [6.25, '6.3 m²'],
    [1_836.4, '1,836 m²'],
    [412_000, '41.2 ha'],
  ])('writes an area of %d m²', (areaM2, text) => {
    expect(plain(formatArea(areaM2, 'en'))).toBe(text)
  })

  it.each([
    [0, '0 %'],
    [0.0004, '< 0.1 %'],
    [0.006, '0.6 %'],
    [0.0996, '10 %'],
    [0.614, '61 %'],
    [1, '100 %'],
  ])('writes a share of %d', (share, text) => {
    expect(plain(formatShare(share, 'en'))).toBe(text)
  })

  it.each([
    [7.4, '7 m'],
    [43, '45 m'],
    [143, '140 m'],
    [1_430, '1.4 km'],
  ])('writes a distance of %d m as a person paces it', (distanceM, text) => {
    expect(plain(formatDistance(distanceM, 'en'))).toBe(text)
  })

  it.each([
    [812, '812 B'],
    [9_320_000, '9.3 MB'],
    [412_000_000, '412 MB'],
  ])('writes a size of %d bytes', (bytes, text) => {
    expect(plain(formatBytes(bytes, 'en'))).toBe(text)
  })

  it('writes volumes, counts and decimals in the language', () => {
    expect(plain(formatVolume(1_234.5, 'en'))).toBe('1,230 m³')
    expect(formatCount(2_400, 'de')).toBe('2.400')
    expect(formatDecimal(-0.001, 'en', 2)).toBe('0')
  })
})

describe('formatDate', () => {
  it('keeps a bare day on its day in every time zone', () => {
    expect(formatDate('2026-10-13', 'en-GB', 'day', 'Pacific/Honolulu')).toBe('13 October 2026')
  })

  it('writes moments on the 24-hour clock of the zone', () => {
    expect(formatDate('2026-10-13T09:42:00Z', 'en-GB', 'time', 'Europe/Vienna')).toBe('11:42')
    expect(formatDate('2026-10-13T09:42:00Z', 'en-GB', 'weekday', 'UTC')).toBe('Tuesday 13 October')
  })

  it('writes a dash for what is no date', () => {
    expect(formatDate('soon', 'en')).toBe('–')
  })
})
