import { numbersOf, optionalNumberOf, type ConformanceInputs } from './inputs'

/** The first of several names under which a number may stand; undefined when none is given. */
export function firstNumberOf(inputs: ConformanceInputs, keys: readonly string[]): number | undefined {
  for (const key of keys) {
    const value = typeof inputs[key] === 'number' ? optionalNumberOf(inputs, key) : undefined
    if (value !== undefined) return value
  }
  return undefined
}

/** The first of several names under which a list of numbers may stand; undefined when none is given. */
export function firstNumbersOf(inputs: ConformanceInputs, keys: readonly string[]): number[] | undefined {
  const key = keys.find((candidate) => Array.isArray(inputs[candidate]))
  return key === undefined ? undefined : numbersOf(inputs, key)
}

/** Confidence of intervals as a share, by `confidence`, `level` or `alpha`; 0.95 unless given, per cent are understood. */
export function confidenceOf(inputs: ConformanceInputs): number {
  const alpha = firstNumberOf(inputs, ['alpha'])
  const given = firstNumberOf(inputs, ['confidence', 'level', 'conf_level'])
  const share = given ?? (alpha === undefined ? 0.95 : 1 - alpha)
  return share > 1 ? share / 100 : share
}
