/** Quantities are estimates: more significant digits than these would promise too much. */
const MOST_DIGITS = 3
const DASH = '–'
const NO_FIGURE = '–'
const UNBROKEN_SPACE = '\u00a0'

/** Unit a mass is written in, and how many kilograms one of it is. */
const MASS_UNITS = [
  { symbol: 'Mt', kg: 1e9 },
  { symbol: 'kt', kg: 1e6 },
  { symbol: 't', kg: 1e3 },
  { symbol: 'kg', kg: 1 },
] as const

/** Symbol of a unit of mass as people read it. */
export type MassUnit = (typeof MASS_UNITS)[number]['symbol']

const numberFormats = new Map<string, Intl.NumberFormat>()

function numberFormat(locale: string, options: Intl.NumberFormatOptions): Intl.NumberFormat {
  const key = locale + JSON.stringify(options)
  const known = numberFormats.get(key)
  if (known) return known
  const made = new Intl.NumberFormat(locale, options)
  numberFormats.set(key, made)
  return made
}

function figure(value: number, locale: string): string {
  return numberFormat(locale, { maximumSignificantDigits: MOST_DIGITS, signDisplay: 'negative' }).format(value)
}

function withUnit(text: string, symbol: string): string {
  return `${text}${UNBROKEN_SPACE}${symbol}`
}

/**
 * Unit in which the largest of some masses is best read, so that a table or an axis can write all its masses in one:
 * kilograms below 1 t, tonnes below 100 kt, kilotonnes below 100 Mt, then megatonnes.
 *
 * @param massesKg masses [kg]; sign and non-finite ones do not matter
 * @example massUnitFor([10_700_000, 460_000]) // => 't'
 */
export function massUnitFor(massesKg: readonly number[]): MassUnit {
  const largestKg = massesKg.reduce((most, mass) => (Number.isFinite(mass) ? Math.max(most, Math.abs(mass)) : most), 0)
  if (largestKg >= 1e11) return 'Mt'
  if (largestKg >= 1e8) return 'kt'
  return largestKg >= 1e3 ? 't' : 'kg'
}

/**
 * A mass for people, in three significant digits at most. (`Intl` knows no tonne, so the symbol is ours.)
 *
 * @param massKg mass [kg]; anything not finite is written as a dash
 * @param unit writes in this unit instead, for tables and axes that share one
 * @example formatMass(18_432_000, 'en') // => '18,400 t'
 */
export function formatMass(massKg: number, locale: string, unit?: MassUnit): string {
  if (!Number.isFinite(massKg)) return NO_FIGURE
  const symbol = unit ?? massUnitFor([massKg])
  return withUnit(formatMassFigure(massKg, locale, symbol), symbol)
}

/**
 * The figure of a mass without its unit, for a column whose head names the unit.
 *
 * @param massKg mass [kg]; anything not finite is written as a dash
 * @example formatMassFigure(4_050_000, 'en', 't') // => '4,050'
 */
export function formatMassFigure(massKg: number, locale: string, unit: MassUnit): string {
  const kg = MASS_UNITS.find((candidate) => candidate.symbol === unit)?.kg ?? 1
  return Number.isFinite(massKg) ? figure(massKg / kg, locale) : NO_FIGURE
}

/**
 * An area for people: square metres, whole from 10 m² on; hectares from 10 ha on.
 *
 * @param areaM2 area [m²]
 * @example formatArea(1836.4, 'en') // => '1,836 m²'
 */
export function formatArea(areaM2: number, locale: string): string {
  if (!Number.isFinite(areaM2)) return NO_FIGURE
  if (Math.abs(areaM2) >= 1e5) return withUnit(figure(areaM2 / 1e4, locale), 'ha')
  return withUnit(formatDecimal(areaM2, locale, Math.abs(areaM2) < 10 ? 1 : 0), 'm²')
}

/**
 * A volume for people, in three significant digits.
 *
 * @param volumeM3 volume [m³]
 * @example formatVolume(1234.5, 'en') // => '1,230 m³'
 */
export function formatVolume(volumeM3: number, locale: string): string {
  return Number.isFinite(volumeM3) ? withUnit(figure(volumeM3, locale), 'm³') : NO_FIGURE
}

/**
 * A number of things, whole and with separators.
 *
 * @example formatCount(2400, 'en') // => '2,400'
 */
export function formatCount(count: number, locale: string): string {
  return formatDecimal(count, locale, 0)
}

/**
 * A number with a fixed most of decimal places.
 *
 * @param decimals most places after the point, 0 to 20
 * @example formatDecimal(1.256, 'en', 2) // => '1.26'
 */
export function formatDecimal(value: number, locale: string, decimals: number): string {
  if (!Number.isFinite(value)) return NO_FIGURE
  return numberFormat(locale, { maximumFractionDigits: decimals, signDisplay: 'negative' }).format(value)
}

/**
 * A share as a percentage: whole from 10 % on, one place below, and "< 0.1 %" rather than a nought that is none.
 *
 * @param share part of one [–]
 * @example formatShare(0.614, 'en') // => '61 %'
 */
export function formatShare(share: number, locale: string): string {
  if (!Number.isFinite(share)) return NO_FIGURE
  const percent = share * 100
  if (percent > 0 && percent < 0.1) return `<${UNBROKEN_SPACE}${withUnit(formatDecimal(0.1, locale, 1), '%')}`
  return withUnit(formatDecimal(percent, locale, Math.abs(percent) < 9.95 ? 1 : 0), '%')
}

/**
 * A span of calendar years, never with separators.
 *
 * @example formatYearRange(2027, 2036) // => '2027–2036'
 */
export function formatYearRange(fromYear: number, toYear: number): string {
  return fromYear === toYear ? String(fromYear) : `${fromYear}${DASH}${toYear}`
}

/**
 * A low and a high as one span in one unit, the unit written once.
 *
 * @param format writes one bound, such as `(kg) => formatMass(kg, locale, unit)`
 * @example formatRange(14_900, 22_600, (value) => formatCount(value, 'en')) // => '14,900 – 22,600'
 */
export function formatRange(low: number, high: number, format: (value: number) => string): string {
  const lowText = format(low)
  const highText = format(high)
  if (lowText === highText) return highText
  const unit = highText.includes(UNBROKEN_SPACE) ? highText.slice(highText.lastIndexOf(UNBROKEN_SPACE)) : ''
  const shortLow = unit !== '' && lowText.endsWith(unit) ? lowText.slice(0, -unit.length) : lowText
  return `${shortLow} ${DASH} ${highText}`
}

/**
 * A span of masses in one unit, chosen by the higher one.
 *
 * @example formatMassRange(1_900_000, 3_600_000, 'en') // => '1,900 – 3,600 t'
 */
export function formatMassRange(lowKg: number, highKg: number, locale: string): string {
  const unit = massUnitFor([lowKg, highKg])
  return formatRange(lowKg, highKg, (massKg) => formatMass(massKg, locale, unit))
}

/** How much of a moment is written. */
export type DateStyle = 'day' | 'day-and-time' | 'time' | 'weekday'

const DATE_OPTIONS: Readonly<Record<DateStyle, Intl.DateTimeFormatOptions>> = {
  day: { day: 'numeric', month: 'long', year: 'numeric' },
  'day-and-time': { day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' },
  time: { hour: '2-digit', minute: '2-digit' },
  weekday: { weekday: 'long', day: 'numeric', month: 'long' },
}

/**
 * A moment or a calendar day for people. A bare day (`2026-10-13`) is that day everywhere, whatever the time zone.
 *
 * @param moment ISO 8601 day or moment
 * @param timeZone IANA name; the device's own when left out
 * @returns the date in the language's order, on the 24-hour clock; a dash when it is no date
 * @example formatDate('2026-10-13', 'en-GB') // => '13 October 2026'
 */
export function formatDate(moment: string, locale: string, style: DateStyle = 'day', timeZone?: string): string {
  const isBareDay = /^\d{4}-\d{2}-\d{2}$/.test(moment)
  const instant = new Date(isBareDay ? `${moment}T00:00:00Z` : moment)
  if (Number.isNaN(instant.getTime())) return NO_FIGURE
  const zone = isBareDay ? 'UTC' : timeZone
  return new Intl.DateTimeFormat(locale, { ...DATE_OPTIONS[style], hourCycle: 'h23', timeZone: zone }).format(instant)
}

/**
 * A distance on foot: metres rounded to what a person can pace, kilometres from 1 km on.
 *
 * @param distanceM distance [m]
 * @example formatDistance(143, 'en') // => '140 m'
 */
export function formatDistance(distanceM: number, locale: string): string {
  if (!Number.isFinite(distanceM)) return NO_FIGURE
  if (distanceM >= 995) return withUnit(formatDecimal(distanceM / 1000, locale, 1), 'km')
  const step = distanceM < 20 ? 1 : distanceM < 100 ? 5 : 10
  return withUnit(formatCount(Math.round(distanceM / step) * step, locale), 'm')
}

/**
 * Size of a file or of the space in use, in decimal steps.
 *
 * @param bytes size [byte], ≥ 0
 * @example formatBytes(9_320_000, 'en') // => '9.3 MB'
 */
export function formatBytes(bytes: number, locale: string): string {
  if (!Number.isFinite(bytes)) return NO_FIGURE
  if (bytes < 1000) return withUnit(formatCount(bytes, locale), 'B')
  const steps = ['kB', 'MB', 'GB', 'TB'] as const
  const step = Math.min(steps.length, Math.floor(Math.log10(bytes) / 3))
  const value = bytes / 1000 ** step
  return withUnit(formatDecimal(value, locale, value < 10 ? 1 : 0), steps[step - 1] ?? 'kB')
}
