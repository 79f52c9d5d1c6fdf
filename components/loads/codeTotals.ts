import type { WasteLine } from '@/shared/api/publications'

/** One waste code over a span of years. */
export type CodeTotal = Omit<WasteLine, 'year'>

const LEVELS = ['low', 'likely', 'high'] as const
type Levels = WasteLine['massKg']

/** Lines of a span of years, both ends included. */
export function linesBetween(lines: readonly WasteLine[], fromYear: number, toYear: number): WasteLine[] {
  return lines.filter(({ year }) => year >= fromYear && year <= toYear)
}

/** Lines added up by waste code, in the order of the codes. */
export function codeTotals(lines: readonly WasteLine[]): CodeTotal[] {
  const totals = new Map<string, CodeTotal>()
  for (const { year: _year, ...line } of lines) {
    const known = totals.get(line.code)
    totals.set(
      line.code,
      known
        ? {
            ...known,
            materials: [...new Set([...known.materials, ...line.materials])],
            massKg: added(known.massKg, line.massKg),
            looseVolumeM3: added(known.looseVolumeM3, line.looseVolumeM3),
            loads: added(known.loads, line.loads),
          }
        : line,
    )
  }
  return [...totals.values()].sort((one, other) => one.code.localeCompare(other.code, 'en'))
}

function added(one: Levels, other: Levels): Levels {
  const sum = { ...one }
  for (const level of LEVELS) sum[level] += other[level]
  return sum
}
