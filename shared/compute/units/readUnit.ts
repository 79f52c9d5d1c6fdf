import { ComputeError } from '@/shared/compute/errors'

/** What a unit measures (powers of length, mass and energy) and its size in metres, kilograms and joules. */
export interface UnitMeaning {
  readonly length: number
  readonly mass: number
  readonly energy: number
  readonly factor: number
}

const FOOT_M = 0.3048
const POUND_KG = 0.45359237
const GALLON_M3 = 231 * (FOOT_M / 12) ** 3

const LENGTHS_M: Readonly<Record<string, number>> = {
  mm: 0.001,
  cm: 0.01,
  dm: 0.1,
  m: 1,
  km: 1000,
  in: FOOT_M / 12,
  ft: FOOT_M,
  yd: 3 * FOOT_M,
  mi: 5280 * FOOT_M,
}
const NAMED_AREAS_M2: Readonly<Record<string, number>> = { ha: 1e4, acre: 43_560 * FOOT_M ** 2 }
const NAMED_VOLUMES_M3: Readonly<Record<string, number>> = {
  l: 0.001,
  gal: GALLON_M3,
  usgal: GALLON_M3,
  imperialgal: 0.00454609,
  ukgal: 0.00454609,
}
const MASSES_KG: Readonly<Record<string, number>> = {
  g: 0.001,
  kg: 1,
  t: 1000,
  kt: 1e6,
  mt: 1e9,
  oz: POUND_KG / 16,
  lb: POUND_KG,
  shortton: 2000 * POUND_KG,
  longton: 2240 * POUND_KG,
  cwt: 100 * POUND_KG,
}
const ENERGIES_J: Readonly<Record<string, number>> = {
  j: 1,
  kj: 1e3,
  mj: 1e6,
  gj: 1e9,
  wh: 3600,
  kwh: 3.6e6,
  mwh: 3.6e9,
}

/** Spelled-out names and their short forms; longer names first. */
const SPELLINGS: readonly (readonly [RegExp, string])[] = [
  [/²/g, '2'],
  [/³/g, '3'],
  [/\^|\*\*/g, ''],
  [/\bmetric tons?\b|\bmetric tonnes?\b|\btonnes?\b/g, 't'],
  [/\b(us |u\.s\. )?short tons?\b|\bus tons?\b|\bshort[_-]tons?\b/g, 'shortton'],
  [/\b(uk |imperial )?long tons?\b|\bimperial tons?\b|\blong[_-]tons?\b/g, 'longton'],
  [/\bus gallons?\b|\bgallons?\b/g, 'gal'],
  [/\bimperial gallons?\b|\bimperial gal\b/g, 'imperialgal'],
  [/\bus gal\b/g, 'usgal'],
  [/\bkilograms?\b/g, 'kg'],
  [/\bgrams?\b/g, 'g'],
  [/\bpounds?\b|\blbs\b/g, 'lb'],
  [/\bounces?\b/g, 'oz'],
  [/\b(foot|feet)\b/g, 'ft'],
  [/\binch(es)?\b/g, 'in'],
  [/\byards?\b/g, 'yd'],
  [/\bmiles?\b/g, 'mi'],
  [/\b(metres?|meters?)\b/g, 'm'],
  [/\bhectares?\b/g, 'ha'],
  [/\bacres?\b|\bac\b/g, 'acre'],
  [/\b(litres?|liters?)\b/g, 'l'],
  [/\bsq(uare|\.)?\s*(mm|cm|dm|km|m|in|ft|yd|mi)\b/g, '$22'],
  [/\bcu(bic|\.)?\s*(mm|cm|dm|km|m|in|ft|yd|mi)\b/g, '$23'],
  [/\bpsf\b/g, 'lb/ft2'],
  [/\bpcf\b/g, 'lb/ft3'],
  [/\bsf\b/g, 'ft2'],
  [/\bcy\b/g, 'yd3'],
  [/\s+per\s+/g, '/'],
  [/\s+/g, ''],
]

/**
 * Meaning of a unit as people write it: powers as `2`, `²` or "square", ratios with `/` or "per".
 *
 * @param unit unit, in any of the usual spellings; `MJ` and `kWh` are energies, `Mt` a million tonnes
 * @returns what it measures and its factor to metres, kilograms, joules
 * @throws {ComputeError} `unknown-code`
 * @see NIST Special Publication 811 (2008), appendix B.
 * @example
 * readUnit('ft2') // => { length: 2, mass: 0, energy: 0, factor: 0.09290304 }
 * readUnit('pounds per cubic yard').mass // => 1
 */
export function readUnit(unit: string): UnitMeaning {
  const short = SPELLINGS.reduce((text, [spelling, form]) => text.replace(spelling, form), unit.trim().toLowerCase())
  const [above = '', ...below] = short.split('/')
  return below.reduce((meaning, part) => divide(meaning, readPlain(part, unit)), readPlain(above, unit))
}

function divide(one: UnitMeaning, other: UnitMeaning): UnitMeaning {
  return {
    length: one.length - other.length,
    mass: one.mass - other.mass,
    energy: one.energy - other.energy,
    factor: one.factor / other.factor,
  }
}

function readPlain(short: string, unit: string): UnitMeaning {
  const nothing = { length: 0, mass: 0, energy: 0 }
  const energyJ = ENERGIES_J[short]
  if (energyJ !== undefined) return { ...nothing, energy: 1, factor: energyJ }
  const massKg = MASSES_KG[short]
  if (massKg !== undefined) return { ...nothing, mass: 1, factor: massKg }
  const areaM2 = NAMED_AREAS_M2[short]
  if (areaM2 !== undefined) return { ...nothing, length: 2, factor: areaM2 }
  const volumeM3 = NAMED_VOLUMES_M3[short]
  if (volumeM3 !== undefined) return { ...nothing, length: 3, factor: volumeM3 }
  const [, name = '', digit = '1'] = /^([a-z]+)([23])?$/.exec(short) ?? []
  const lengthM = LENGTHS_M[name]
  if (lengthM === undefined) throw new ComputeError('unknown-code', { unit })
  const power = Number(digit)
  return { ...nothing, length: power, factor: lengthM ** power }
}
