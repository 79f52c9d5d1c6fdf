import { z } from 'zod'
import { geodesicDistance } from '@/shared/compute/spatial/geodesicDistance'
import type { Position } from '@/shared/compute/spatial/spatial.types'
import type { RawFeature } from './outlines.types'

const NEAR_M = 100_000
const degrees = z.number().min(-360).max(360)
const possiblePair = z.tuple([degrees, degrees]).rest(z.unknown())

/**
 * Where most of a file lies: the median of first positions. When that lies far from the known outlines as it stands
 * but near them when turned round, the whole file is swapped, and the turned position is the answer.
 *
 * @returns undefined when the file holds no position on Earth
 */
export function typicalPosition(features: readonly RawFeature[], known?: Position): Position | undefined {
  const firsts = features.map(({ geometry }) => firstPosition(geometry)).filter((pair) => pair !== undefined)
  const x = median(firsts.map(([first]) => first))
  const y = median(firsts.map(([, second]) => second))
  if (x === undefined || y === undefined || !isOnEarth(x, y)) return known
  if (known === undefined || !isOnEarth(y, x)) return [x, y]
  const isFar = geodesicDistance([x, y], known).distanceM > NEAR_M
  return isFar && geodesicDistance([y, x], known).distanceM <= NEAR_M ? [y, x] : [x, y]
}

function firstPosition(geometry: unknown): [number, number] | undefined {
  const { coordinates } = (geometry ?? {}) as { coordinates?: unknown }
  let value = coordinates
  while (Array.isArray(value) && Array.isArray(value[0])) value = value[0]
  const pair = possiblePair.safeParse(value)
  return pair.success ? [pair.data[0], pair.data[1]] : undefined
}

function median(values: readonly number[]): number | undefined {
  return [...values].sort((one, other) => one - other)[Math.floor(values.length / 2)]
}

function isOnEarth(longitude: number, latitude: number): boolean {
  return Math.abs(longitude) <= 180 && Math.abs(latitude) <= 90
}
