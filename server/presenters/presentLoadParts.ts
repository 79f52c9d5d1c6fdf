import { BULK_DENSITIES } from '@/shared/compute/waste/bulkDensities'
import { looseVolume } from '@/shared/compute/waste/looseVolume'
import type { WasteLine } from '@/shared/api/publications'
import type { LoadReceipt } from '@/shared/api/receipts'
import type { FullEdition } from '@/shared/schemas/factorBook'
import type { RunResult } from '@/shared/schemas/run'

/** Materials and flows of a line, which add up to it, with densities and the sources of the contents. */
export function presentLoadParts(
  { year, materials }: WasteLine,
  { yearsAhead, stock }: RunResult,
  { rows }: FullEdition,
): Pick<LoadReceipt, 'parts' | 'densities' | 'sources'> {
  const k = yearsAhead.years.indexOf(year)
  const parts = materials.flatMap((material) =>
    (['demolition', 'refurbishment'] as const).flatMap((flow): LoadReceipt['parts'] => {
      const series = yearsAhead[flow].byMaterial[material]
      if (!series) return []
      const massKg = { low: series.p10Kg[k] ?? 0, likely: series.meanKg[k] ?? 0, high: series.p90Kg[k] ?? 0 }
      const { lowKgPerM3: low, likelyKgPerM3: likely, highKgPerM3: high } = BULK_DENSITIES[material]
      return [
        {
          material,
          flow,
          massKg,
          densityKgPerM3: { low, likely, high },
          looseVolumeM3: {
            low: looseVolume(massKg.low, high),
            likely: looseVolume(massKg.likely, likely),
            high: looseVolume(massKg.high, low),
          },
        },
      ]
    }),
  )
  return {
    parts,
    densities: materials.map((material) => {
      const { source, provenance } = BULK_DENSITIES[material]
      return { material, source, provenance }
    }),
    sources: sourcesOf(materials, stock, rows),
  }
}

function sourcesOf(
  materials: WasteLine['materials'],
  stock: RunResult['stock'],
  rows: FullEdition['rows'],
): LoadReceipt['sources'] {
  const rowOf = new Map(rows.intensities.map((row) => [row.rowId, row]))
  const sources = new Map<string, LoadReceipt['sources'][number]>()
  for (const { material, factorRowIds } of stock.byMaterial) {
    if (!materials.includes(material)) continue
    for (const rowId of factorRowIds) {
      const row = rowOf.get(rowId)
      if (!row) continue
      const known = sources.get(row.source) ?? { source: row.source, provenance: row.provenance, materials: [] }
      if (!known.materials.includes(material)) known.materials.push(material)
      sources.set(row.source, known)
    }
  }
  return [...sources.values()]
}
