import type { ConformanceMethod } from '@/tests/conformance/check.types'
import { isRecord, type ConformanceInputs } from '@/tests/conformance/inputs'
import { dynamicsMethods } from './dynamics'
import { renewalMethods } from './renewals'
import { standingMethods } from './standing'

/** Which method inputs belong to, by the keys that only it has. The first that has all its keys is taken. */
const METHOD_BY_KEYS: readonly (readonly [keys: readonly string[], method: string])[] = [
  [['mean_sd', 'construction_years'], 'implied-rate'],
  [['construction_years', 'floor_area_m2', 'family'], 'standing-flows'],
  [['interval', 'family'], 'standing-interval'],
  [['component', 'building'], 'renewals-in-building'],
  [['family', 'N', 'age'], 'renewals-known-age'],
  [['family', 'N'], 'renewals'],
  [['family', 'age'], 'standing-single'],
  [['family', 'stock'], 'stock-driven-shrink'],
  [['family', 'I'], 'inflow-driven'],
  [['pop0', 'sat'], 'stock-driven-per-capita'],
  [['family', 'C', 'r'], 'stock-driven-logistic'],
  [['multipliers'], 'hazard-multipliers'],
  [['lifetime', 'ages'], 'standing-overdue'],
]
const METHODS = { ...standingMethods, ...renewalMethods, ...dynamicsMethods }

/**
 * Figures of the right computation under the names of the mistake as well, so that a check can see that they differ;
 * undefined when the inputs are not of a kind known here.
 */
export function dynamicsCounterExample(inputs: ConformanceInputs): unknown {
  const found = METHOD_BY_KEYS.find(([keys]) => keys.every((key) => inputs[key] !== undefined))
  const compute: ConformanceMethod | undefined = found && METHODS[found[1]]
  const figures = compute?.(inputs)
  if (!isRecord(figures)) return undefined
  const named = Object.entries({ ...figures, ...shortNames(figures) })
  const under = (prefix: string) => Object.fromEntries(named.map(([key, figure]) => [`${prefix}_${key}`, figure]))
  return { ...figures, correct: figures, ...under('correct'), ...under('naive'), ...under('wrong') }
}

function shortNames(figures: Readonly<Record<string, unknown>>) {
  return { cumulative: figures.cumulative_flow_m2 ?? figures.cumulative, remaining: figures.remaining_m2 }
}
