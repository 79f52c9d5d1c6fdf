import { intensityFor } from '@/shared/compute/factors/intensityFor'
import { plausibilityBand, type Plausibility } from '@/shared/compute/factors/plausibilityBand'
import { MATERIALS, type Structure, type Use } from '@/shared/compute/factors/vocabulary'
import type { IntensityRow } from '@/shared/schemas/factorBook'

/** The mass of all materials of a kind of building by one edition, beside that of published whole buildings. */
export interface ArchetypeSum extends Plausibility {
  readonly key: string
  readonly structure: Structure
  readonly use: Use | 'all'
  readonly totalKgPerM2: number
}

/**
 * Adds the factors of each structure and use of the book up, as a run would take them, and holds each sum against the
 * published P10–P90 of whole buildings.
 *
 * @example archetypeSums([]) // => []
 */
export function archetypeSums(rows: readonly IntensityRow[]): ArchetypeSum[] {
  const byMaterial = MATERIALS.map((material) => ({ material, rows: rows.filter((row) => row.material === material) }))
  const seen = new Map<string, Pick<ArchetypeSum, 'structure' | 'use'>>()
  for (const { structure, use } of rows) if (structure !== 'all') seen.set(`${structure}/${use}`, { structure, use })
  return [...seen].map(([key, { structure, use }]) => {
    const archetype = { structure, use: use === 'all' ? ('unknown' as const) : use, periodId: 'unknown' as const }
    const totalKgPerM2 = byMaterial.reduce((total, { material, rows: ofMaterial }) => {
      const found = intensityFor(archetype, material, ofMaterial)
      return total + (found.kind === 'known' ? found.meanKgPerM2 : 0)
    }, 0)
    return { key, structure, use, totalKgPerM2, ...plausibilityBand(structure, totalKgPerM2) }
  })
}
