import type { DistrictComputation } from '@/shared/compute/run/computeDistrict'
import type { VarianceByCause } from '@/shared/compute/run/run.types'
import { sharesOfVariance } from '@/shared/compute/run/stockOfCells'
import { PLAUSIBLE_DEMOLITION_RATE } from '@/shared/compute/stock/impliedDemolitionRate'
import type { RunBasis } from '@/shared/schemas/run'
import type { RunInputs, RunSheet } from './runInputs.types'

/** What a reader must be told beside every figure of a run. */
export function presentBasis({ frame, sheets }: RunInputs, { stock, yearsAhead }: DistrictComputation): RunBasis {
  const count = (holds: (sheet: RunSheet) => boolean) => sheets.filter(holds).length
  const total = (value: (sheet: RunSheet) => number) => sheets.reduce((sum, sheet) => sum + value(sheet), 0)
  const computedFloorAreaM2 = total(({ grossFloorAreaM2 }) => grossFloorAreaM2)
  const rate = (yearsAhead.expectedFloorAreaM2[0] ?? 0) / computedFloorAreaM2
  const tenth = Math.min(9, yearsAhead.cumulativeDemolition.meanKg.length - 1)
  const { measurement, factor, lifetime, chance } = yearsAhead.cumulativeDemolition.varianceByCauseKg2
  const tenYears: VarianceByCause = {
    measurement: measurement[tenth] ?? 0,
    factor: factor[tenth] ?? 0,
    lifetime: lifetime[tenth] ?? 0,
    chance: chance[tenth] ?? 0,
  }
  return {
    areaBasis: 'GFA',
    ...frame,
    computedCount: sheets.length,
    computedFootprintM2: total(({ footprintM2 }) => footprintM2),
    computedFloorAreaM2,
    unknownUseCount: count(({ use }) => use === 'unknown'),
    unknownStructureCount: count(({ structure }) => structure === 'unknown'),
    unknownYearCount: count(({ yearFrom }) => yearFrom === null),
    unknownStoreysCount: count(({ isStoreysKnown }) => !isStoreysKnown),
    overdueCount: Math.round(yearsAhead.overdueBuildings),
    impliedDemolitionRatePerYear: rate,
    impliedRateWarning:
      rate < PLAUSIBLE_DEMOLITION_RATE.least
        ? 'below-band'
        : rate > PLAUSIBLE_DEMOLITION_RATE.most
          ? 'above-band'
          : null,
    varianceSharesOfStock: sharesOfVariance(stock.total.varianceByCauseKg2),
    varianceSharesOfTenYearFlow: sharesOfVariance(tenYears),
  }
}
