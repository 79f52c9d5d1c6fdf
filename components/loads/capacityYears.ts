import type { WasteLine } from '@/shared/api/publications'

/** Whether what comes in one year fits into a plant. */
export type CapacityVerdict = 'fits' | 'may-exceed' | 'exceeds'

/** All waste of one year [kg], low and high as the sums of those of its codes, beside a plant. */
export interface CapacityYear {
  readonly year: number
  readonly lowKg: number
  readonly likelyKg: number
  readonly highKg: number
  readonly verdict: CapacityVerdict
}

/**
 * What comes in each year beside what a plant takes in: it *exceeds* where the likely mass is more, and *may exceed*
 * where only the high one is.
 *
 * @param lines waste lines, in any order
 * @param capacityKg what the plant takes in a year [kg], ≥ 0
 * @returns one row a year that has lines, in order
 */
export function capacityYears(lines: readonly WasteLine[], capacityKg: number): CapacityYear[] {
  const sums = new Map<number, { lowKg: number; likelyKg: number; highKg: number }>()
  for (const { year, massKg } of lines) {
    const known = sums.get(year) ?? { lowKg: 0, likelyKg: 0, highKg: 0 }
    sums.set(year, {
      lowKg: known.lowKg + massKg.low,
      likelyKg: known.likelyKg + massKg.likely,
      highKg: known.highKg + massKg.high,
    })
  }
  return [...sums]
    .sort(([one], [other]) => one - other)
    .map(([year, masses]) => ({ year, ...masses, verdict: verdictOf(masses, capacityKg) }))
}

function verdictOf({ likelyKg, highKg }: { likelyKg: number; highKg: number }, capacityKg: number): CapacityVerdict {
  if (likelyKg > capacityKg) return 'exceeds'
  return highKg > capacityKg ? 'may-exceed' : 'fits'
}
