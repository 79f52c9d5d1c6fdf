import { ComputeError } from '@/shared/compute/errors'
import type { Component } from '@/shared/compute/factors/vocabulary'
import { HAZARD_ROWS, type HazardRow } from './hazardRows'

/** Half-open interval of calendar years; null is an open end. */
export interface YearInterval {
  readonly fromYear: number | null
  readonly toYear: number | null
}

/** What is known of the times at which things were built in. */
export interface BuildingYears {
  /** Construction, or `unknown`. */
  readonly construction: YearInterval | 'unknown'
  readonly refurbishments?: readonly { readonly components: readonly Component[]; readonly years: YearInterval }[]
  /** Country as ISO 3166 code: rows of other countries are left out. */
  readonly country?: string
}

/** A prompt for sampling. Having none never means free of hazards. */
export interface HazardSuspicion {
  readonly row: HazardRow
  /** Why: built or refurbished in those years, possibly added later to an older building, or the year is unknown. */
  readonly because: 'built-then' | 'refurbished-then' | 'may-have-been-added' | 'year-unknown'
}

/**
 * Substances to be suspected in a building by its years and elements. A suspicion is confirmed or dropped by a licensed
 * person only; surveyors never touch, drill, break or sample.
 *
 * @param years construction and refurbishments; an interval that overlaps the years of use counts
 * @param rows periods by element; national dates are settings
 * @returns suspicions in the order of the rows
 * @throws {ComputeError} `interval-reversed`
 * @see sources of each row, kept with it.
 * @example
 * hazardSuspicions({ construction: { fromYear: 1965, toYear: 1966 }, country: 'NL' }).some(({ row }) => row.id === 'pcb-sealants') // => true
 * hazardSuspicions({ construction: { fromYear: 2022, toYear: 2023 } }).length // => 0
 */
export function hazardSuspicions(years: BuildingYears, rows: readonly HazardRow[] = HAZARD_ROWS): HazardSuspicion[] {
  const { construction, refurbishments = [], country } = years
  for (const interval of [construction, ...refurbishments.map((refurbishment) => refurbishment.years)]) {
    if (interval !== 'unknown' && isReversed(interval)) throw new ComputeError('interval-reversed', { ...interval })
  }
  return rows
    .filter((row) => row.country === undefined || row.country === country)
    .flatMap((row): HazardSuspicion[] => {
      const because = reasonFor(row, construction, refurbishments)
      return because === undefined ? [] : [{ row, because }]
    })
}

function reasonFor(
  row: HazardRow,
  construction: BuildingYears['construction'],
  refurbishments: NonNullable<BuildingYears['refurbishments']>,
): HazardSuspicion['because'] | undefined {
  if (construction === 'unknown') return 'year-unknown'
  if (overlaps(row, construction)) return 'built-then'
  const refurbished = refurbishments.some(
    ({ components, years }) => components.some((part) => row.components.includes(part)) && overlaps(row, years),
  )
  if (refurbished) return 'refurbished-then'
  const isOlder = construction.toYear !== null && construction.toYear <= (row.fromYear ?? -Infinity)
  const isRenewable = row.components.some((part) => part !== 'structure')
  return isOlder && isRenewable ? 'may-have-been-added' : undefined
}

function overlaps(row: HazardRow, { fromYear, toYear }: YearInterval): boolean {
  return (fromYear ?? -Infinity) < row.toYear && (row.fromYear ?? -Infinity) < (toYear ?? Infinity)
}

function isReversed({ fromYear, toYear }: YearInterval): boolean {
  return fromYear !== null && toYear !== null && !(fromYear < toYear)
}
