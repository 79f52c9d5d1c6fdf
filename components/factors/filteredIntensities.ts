import type { IntensityRow } from '@/shared/schemas/factorBook'

/** What intensities are narrowed to; `all` narrows nothing. */
export interface IntensityFilter {
  readonly structure: string
  readonly use: string
  readonly material: string
}

/**
 * Rows that hold for a structure, a use and a material. A row for all structures holds for each of them, so it stays
 * when one structure is chosen; the same with uses.
 */
export function filteredIntensities(
  rows: readonly IntensityRow[],
  { structure, use, material }: IntensityFilter,
): IntensityRow[] {
  const fits = (of: string, wanted: string): boolean => wanted === 'all' || of === 'all' || of === wanted
  return rows.filter(
    (row) => fits(row.structure, structure) && fits(row.use, use) && (material === 'all' || row.material === material),
  )
}
