import type { LifetimeFigure } from '@/shared/compute/run/resolveArchetype'
import type { Scenario } from '@/shared/schemas/run'

/** A scenario's lifetimes stand before those of the edition: an override of a use is the most specific row. */
export function lifetimesOf<Row extends LifetimeFigure>(
  lifetimes: readonly Row[],
  { lifetimeOverrides }: Scenario,
): Row[] {
  return lifetimes.map((row) => {
    if (row.component !== 'building') return row
    const override =
      lifetimeOverrides.find(({ use }) => use === row.use) ?? lifetimeOverrides.find(({ use }) => use === 'all')
    return override ? { ...row, model: override.model, meanYears: override.meanYears, sdYears: override.sdYears } : row
  })
}
