import type { Random } from './town.types'

/** True with the given chance. */
export const chance = (random: Random, share: number): boolean => random.next() < share

/** Evenly between two numbers. */
export const between = (random: Random, low: number, high: number): number => low + (high - low) * random.next()

/** A whole number from low to high, both possible. */
export const wholeBetween = (random: Random, low: number, high: number): number =>
  Math.floor(between(random, low, high + 1))

/** One of several, by weight. */
export function choose<Value>(random: Random, weighted: readonly (readonly [Value, number])[]): Value {
  const whole = weighted.reduce((total, [, weight]) => total + weight, 0)
  let rest = random.next() * whole
  for (const [value, weight] of weighted) {
    rest -= weight
    if (rest < 0) return value
  }
  return weighted.at(-1)![0]
}
