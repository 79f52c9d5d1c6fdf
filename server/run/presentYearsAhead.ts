import type { DistrictComputation } from '@/shared/compute/run/computeDistrict'
import { flowBand } from '@/shared/compute/run/flowBand'
import type { FlowByMaterial, FlowEstimate } from '@/shared/compute/run/yearsAheadOfCells'
import type { BandSeries, RunResult } from '@/shared/schemas/run'
import type { RunInputs } from './runInputs.types'

/** Flows by year as the contract shows them: the first year is the one after the survey. */
export function presentYearsAhead(inputs: RunInputs, { yearsAhead }: DistrictComputation): RunResult['yearsAhead'] {
  return {
    years: Array.from({ length: inputs.scenario.horizonYears }, (_, k) => inputs.surveyYear + 1 + k),
    demolition: presentFlow(yearsAhead.demolition),
    refurbishment: presentFlow(yearsAhead.refurbishment),
    expectedBuildings: [...yearsAhead.expectedBuildings],
    expectedFloorAreaM2: [...yearsAhead.expectedFloorAreaM2],
    cumulative: toSeries(yearsAhead.cumulativeDemolition),
  }
}

function presentFlow({ total, byMaterial }: FlowByMaterial) {
  return {
    total: toSeries(total),
    byMaterial: Object.fromEntries([...byMaterial].map(([material, flow]) => [material, toSeries(flow)])),
  }
}

function toSeries(flow: FlowEstimate): BandSeries {
  const bands = Array.from(flow.meanKg, (_, year) => flowBand(flow, year))
  return {
    meanKg: bands.map((band) => band.meanKg),
    p10Kg: bands.map((band) => band.p10Kg),
    p90Kg: bands.map((band) => band.p90Kg),
  }
}
