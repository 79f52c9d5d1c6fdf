import { lifetimeMoments } from '@/shared/compute/lifetime/lifetimeMoments'
import { comingDownChances } from '@/shared/compute/stock/comingDownChances'
import { componentFlows } from '@/shared/compute/stock/componentFlows'
import { equilibriumRenewals } from '@/shared/compute/stock/equilibriumRenewals'
import { knownAgeRenewals } from '@/shared/compute/stock/knownAgeRenewals'
import { newComponentRenewals } from '@/shared/compute/stock/newComponentRenewals'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import { numberOf, numbersOf, optionalNumberOf, recordOf, type ConformanceInputs } from '@/tests/conformance/inputs'
import { lifetimeOf } from '@/tests/conformance/lifetimeInput'
import { rowsBy } from '@/tests/conformance/shownInPart'

const horizonOf = (inputs: ConformanceInputs) => optionalNumberOf(inputs, 'N') ?? numberOf(inputs, 'years')
const total = (values: Iterable<number>) => [...values].reduce((sum, value) => sum + value, 0)

function seriesFigures(inputs: ConformanceInputs, series: Float64Array) {
  const quarter = Math.floor(series.length / 4)
  const usual = inputs.at === undefined ? [quarter, 2 * quarter, series.length] : numbersOf(inputs, 'at')
  return {
    cumulative: total(series),
    at: rowsBy('n', usual, (n) => ({ cumulative: total(series.subarray(0, n)) })),
  }
}

function newFigures(inputs: ConformanceInputs) {
  const { all } = newComponentRenewals(lifetimeOf(inputs), horizonOf(inputs))
  return { u: all, ...seriesFigures(inputs, all) }
}

function knownAgeFigures(inputs: ConformanceInputs) {
  const { all, first } = knownAgeRenewals(lifetimeOf(inputs), numberOf(inputs, 'age'), horizonOf(inputs))
  return { v: all, g: first, ...seriesFigures(inputs, all) }
}

function stationaryFigures(inputs: ConformanceInputs) {
  const lifetime = lifetimeOf(inputs)
  return { rate: equilibriumRenewals(lifetime, 1).all[0], continuous_mean_life: lifetimeMoments(lifetime).meanYears }
}

function inBuildingFigures(inputs: ConformanceInputs) {
  const [component, building] = [recordOf(inputs, 'component'), recordOf(inputs, 'building')]
  const years = optionalNumberOf(inputs, 'years') ?? horizonOf(component)
  const massKg = optionalNumberOf(inputs, 'mass') ?? 1
  const { refurbishmentKg, demolitionKg, inflowKg } = componentFlows({
    renewals: knownAgeRenewals(lifetimeOf(component), optionalNumberOf(component, 'age') ?? 0, years),
    building: comingDownChances(lifetimeOf(building), numberOf(building, 'age'), years),
    massKg,
  })
  const [refurbishment, demolition] = [total(refurbishmentKg), total(demolitionKg)]
  return {
    refurbishment: refurbishmentKg,
    demolition: demolitionKg,
    inflow: inflowKg,
    refurbishment_total: refurbishment,
    demolition_total: demolition,
    total: refurbishment + demolition,
  }
}

/** Components renewed while their building stands. */
export const renewalMethods: Readonly<Record<string, ConformanceMethod>> = {
  renewals: newFigures,
  'renewals-known-age': knownAgeFigures,
  'renewals-stationary': stationaryFigures,
  'renewals-in-building': inBuildingFigures,
}
