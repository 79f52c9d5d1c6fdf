import { MATERIALS, type Material } from '@/shared/compute/factors/vocabulary'
import { BULK_DENSITIES } from '@/shared/compute/waste/bulkDensities'
import { containerLoads } from '@/shared/compute/waste/containerLoads'
import { wasteCodeEntry } from '@/shared/compute/waste/wasteCodeEntry'
import { wasteLines, type WasteLine } from '@/shared/compute/waste/wasteLines'
import type { LoadsAhead } from '@/shared/api/publications'
import type { RunResult } from '@/shared/schemas/run'

interface Fleet {
  readonly containerM3: number
  readonly payloadT: number
}

type Level = 'low' | 'likely' | 'high'

/**
 * Flows of a run as waste lines by year. Demolition and refurbishment are added; low and high are the P10 and P90 of
 * the materials added up, because the errors of their factors are shared by all buildings.
 */
export function presentLoads(
  { years, demolition, refurbishment }: RunResult['yearsAhead'],
  fleet: Fleet,
): Pick<LoadsAhead, 'years' | 'lines' | 'unassigned' | 'densities'> {
  const materials = MATERIALS.filter((material) => demolition.byMaterial[material])
  const massOf = (material: Material, k: number, level: Level) => {
    const key = ({ low: 'p10Kg', likely: 'meanKg', high: 'p90Kg' } as const)[level]
    return (demolition.byMaterial[material]?.[key][k] ?? 0) + (refurbishment.byMaterial[material]?.[key][k] ?? 0)
  }
  const lines = years.flatMap((year, k) => {
    const at = (level: Level) =>
      wasteLines(materials.map((material) => ({ material, massKg: massOf(material, k, level) })))
    return mergeLevels(year, at('low'), at('likely'), at('high'), fleet)
  })
  return { years, lines, unassigned: [], densities: presentDensities(lines) }
}

function mergeLevels(
  year: number,
  low: readonly WasteLine[],
  likely: readonly WasteLine[],
  high: readonly WasteLine[],
  fleet: Fleet,
): LoadsAhead['lines'] {
  return likely.map((line, index) => {
    const levels = { low: low[index]!, likely: line, high: high[index]! }
    const entry = wasteCodeEntry(line.code)
    return {
      year,
      code: line.code,
      text: entry.text,
      isHazardous: entry.isHazardous,
      mirrorHazardousCode: line.alternatives.filter((code) => code.endsWith('*')).join(', ') || null,
      materials: [...line.materials],
      massKg: { low: levels.low.massKg, likely: line.massKg, high: levels.high.massKg },
      looseVolumeM3: {
        low: levels.low.looseVolumeM3.low,
        likely: line.looseVolumeM3.likely,
        high: levels.high.looseVolumeM3.high,
      },
      loads: {
        low: loadsOf(levels.low, 'low', fleet),
        likely: loadsOf(line, 'likely', fleet),
        high: loadsOf(levels.high, 'high', fleet),
      },
    }
  })
}

function loadsOf(line: WasteLine, level: Level, { containerM3, payloadT }: Fleet): number {
  return containerLoads(line.massKg, line.looseVolumeM3[level], { volumeM3: containerM3, payloadKg: payloadT * 1_000 })
    .loads
}

function presentDensities(lines: LoadsAhead['lines']): LoadsAhead['densities'] {
  const pairs = new Map(
    lines.flatMap(({ code, materials }) =>
      materials.map((material) => [`${code}/${material}`, { code, material }] as const),
    ),
  )
  return [...pairs.values()].map(({ code, material }) => {
    const { lowKgPerM3, highKgPerM3, source, provenance } = BULK_DENSITIES[material]
    return { code, lowKgPerM3, highKgPerM3, source, provenance }
  })
}
