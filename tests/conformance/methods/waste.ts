import { convertUnit } from '@/shared/compute/units/convertUnit'
import { containerLoads } from '@/shared/compute/waste/containerLoads'
import { looseVolume } from '@/shared/compute/waste/looseVolume'
import { mirrorCodes } from '@/shared/compute/waste/mirrorCodes'
import { recoveryShare, type WasteStream } from '@/shared/compute/waste/recoveryShare'
import { wasteCodeEntry } from '@/shared/compute/waste/wasteCodeEntry'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import {
  isRecord,
  listOf,
  numberOf,
  optionalNumberOf,
  recordOf,
  textOf,
  type ConformanceInputs,
} from '@/tests/conformance/inputs'

const KG_PER_TONNE = 1000

/** A number for all fractions, or one for each. */
function numberFor(inputs: ConformanceInputs, key: string, fraction: string): number {
  return isRecord(inputs[key]) ? numberOf(recordOf(inputs, key), fraction) : numberOf(inputs, key)
}

function massesKg(inputs: ConformanceInputs): [string, number][] {
  const [key, perUnit] = inputs.mass_t === undefined ? (['mass_kg', 1] as const) : (['mass_t', KG_PER_TONNE] as const)
  const masses = recordOf(inputs, key)
  return Object.keys(masses).map((fraction) => [fraction, numberOf(masses, fraction) * perUnit])
}

function payloadKg(inputs: ConformanceInputs, fraction: string): number {
  return inputs.payload_kg === undefined
    ? numberFor(inputs, 'payload_t', fraction) * KG_PER_TONNE
    : numberFor(inputs, 'payload_kg', fraction)
}

function loadFigures(inputs: ConformanceInputs) {
  const rows = massesKg(inputs).map(([fraction, massKg]) => {
    const looseM3 = looseVolume(massKg, numberFor(inputs, 'bulk_density', fraction))
    const container = { volumeM3: numberFor(inputs, 'container_m3', fraction), payloadKg: payloadKg(inputs, fraction) }
    return { fraction, looseM3, ...containerLoads(massKg, looseM3, container) }
  })
  return {
    loose_m3: Object.fromEntries(rows.map(({ fraction, looseM3 }) => [fraction, looseM3])),
    loads: Object.fromEntries(rows.map(({ fraction, loads }) => [fraction, loads])),
    limited_by: Object.fromEntries(rows.map(({ fraction, limitedBy }) => [fraction, limitedBy])),
    total_loads: rows.reduce((total, { loads }) => total + loads, 0),
    total_loose_m3: rows.reduce((total, { looseM3 }) => total + looseM3, 0),
  }
}

function unitFigures(inputs: ConformanceInputs) {
  const value = numberOf(inputs, 'value')
  if (inputs.from !== undefined) return { result: convertUnit(value, textOf(inputs, 'from'), textOf(inputs, 'to')) }
  const [from = '', to = ''] = textOf(inputs, 'convert').split(/\s+(?:to|in|into)\s+|\s*(?:->|→)\s*/)
  return { result: convertUnit(value, from, to) }
}

function wasteCodeFigures(inputs: ConformanceInputs) {
  return Object.fromEntries(
    listOf(inputs, 'codes').map((code) => {
      const given = String(code)
      return [given, wasteCodeEntry(given).text]
    }),
  )
}

/** The codes asked about: the keys of `pairs`, or a list of codes. The counterparts given with them are not read. */
function mirrorFigures(inputs: ConformanceInputs) {
  const pairs = inputs.pairs
  const asked = isRecord(pairs)
    ? Object.keys(pairs)
    : listOf(inputs, pairs === undefined ? 'codes' : 'pairs').map((entry) =>
        String(Array.isArray(entry) ? entry[0] : entry),
      )
  return Object.fromEntries(
    asked.map((code) => {
      const counterparts = mirrorCodes(code)
      return [code, counterparts.length === 1 ? counterparts[0] : [...counterparts]]
    }),
  )
}

function recoveryFigures(inputs: ConformanceInputs) {
  const streams = listOf(inputs, 'streams').map((entry): WasteStream => {
    if (!isRecord(entry)) throw new Error('a stream is not an object')
    return {
      code: textOf(entry, 'code'),
      massKg: numberOf(entry, 't') * KG_PER_TONNE,
      recoveredKg: (optionalNumberOf(entry, 'recovered_t') ?? 0) * KG_PER_TONNE,
      isEnergyRecovery: entry.energy_recovery === true,
      ...(typeof entry.hazardous === 'boolean' && { isHazardous: entry.hazardous }),
    }
  })
  const { share, meetsTarget, countedKg, recoveredKg } = recoveryShare(streams)
  return {
    rate: share,
    meets_70: meetsTarget,
    counted_t: countedKg / KG_PER_TONNE,
    recovered_t: recoveredKg / KG_PER_TONNE,
    wrong_rate_all_streams: share,
  }
}

/** Waste codes, containers and units. */
export const wasteMethods: Readonly<Record<string, ConformanceMethod>> = {
  loads: loadFigures,
  'unit-conversion': unitFigures,
  'waste-codes': wasteCodeFigures,
  'waste-mirror': mirrorFigures,
  'recovery-rate': recoveryFigures,
}
