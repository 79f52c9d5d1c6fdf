import { ComputeError } from '@/shared/compute/errors'
import { coordinateFault } from './coordinateFault'
import { openRing } from './openRing'
import { ringCrossing } from './ringCrossing'
import { ringOrientation } from './ringOrientation'
import type { Position, Ring } from './spatial.types'

/** What had to be changed to make a ring conform. */
export type RingChange = 'closed' | 'reversed' | 'rounded' | 'repeats-removed'

/** How a ring is to be read. */
export interface NormaliseRingOptions {
  readonly role?: 'exterior' | 'hole'
  /** A position of the district [°], to recognise swapped coordinates. */
  readonly near?: Position
}

/** A conforming ring and what was changed. */
export interface NormalisedRing {
  readonly ring: Ring
  readonly changes: readonly RingChange[]
}

const STEPS_PER_DEGREE = 1e7

/**
 * A ring as RFC 7946 wants it: WGS84 [longitude, latitude], at most seven decimals (about 1 cm), first position
 * repeated at the end, exterior counter-clockwise, holes clockwise. Heights and repeats in a row are dropped.
 * Order, closure and digits are put right and reported; rings that mean nothing are refused.
 *
 * @param positions pairs (or longer) as read from a file
 * @returns the ring and the changes made to it
 * @throws {ComputeError} `not-a-number`, `coordinates-projected`, `coordinates-swapped`, `coordinates-out-of-range`;
 *   `ring-too-short` fewer than four positions or three different corners; `ring-crosses-itself` (with the place);
 *   `ring-invalid` encloses nothing
 * @see RFC 7946 (2016). The GeoJSON format, sections 3.1.1, 3.1.6 and 11.2.
 * @example
 * normaliseRing([[0, 0], [0, 1], [1, 1], [1, 0], [0, 0]]).ring // => [[0, 0], [1, 0], [1, 1], [0, 1], [0, 0]]
 * normaliseRing([[0, 0], [1, 0], [1, 1]]).changes // => ['closed']
 */
export function normaliseRing(
  positions: readonly (readonly number[])[],
  { role = 'exterior', near }: NormaliseRingOptions = {},
): NormalisedRing {
  const fault = coordinateFault(positions, near)
  if (fault !== undefined) throw new ComputeError(fault, { firstPosition: positions[0] })
  const given = positions.map(([longitude = 0, latitude = 0]): Position => [longitude, latitude])
  const rounded = given.map(([longitude, latitude]): Position => [toStep(longitude), toStep(latitude)])
  const corners = openRing(rounded)
  const isClosed = isSame(given[0], given.at(-1)) && given.length > 1
  if (corners.length < 3) throw new ComputeError('ring-too-short', { positions: positions.length })
  const crossing = ringCrossing(corners)
  if (crossing !== undefined) throw new ComputeError('ring-crosses-itself', { at: toDegrees(crossing) })
  const orientation = ringOrientation(corners.map(toDegrees))
  if (orientation === 'none') throw new ComputeError('ring-invalid', { positions: positions.length })

  const mustReverse = orientation !== (role === 'exterior' ? 'counter-clockwise' : 'clockwise')
  const changes: RingChange[] = mustReverse ? ['reversed'] : []
  if (!isClosed) changes.unshift('closed')
  if (!isSameLine(given, rounded.map(toDegrees))) changes.push('rounded')
  if (corners.length < given.length - (isClosed ? 1 : 0)) changes.push('repeats-removed')
  return { ring: ordered(corners, mustReverse).map(toDegrees), changes }
}

function ordered(corners: Ring, mustReverse: boolean): Ring {
  const [first, ...rest] = corners
  if (first === undefined) return []
  return mustReverse ? [first, ...rest.reverse(), first] : [first, ...rest, first]
}

function isSameLine(one: Ring, other: Ring): boolean {
  return one.every((position, index) => isSame(position, other[index]))
}

function toStep(degrees: number): number {
  return Math.round(degrees * STEPS_PER_DEGREE) + 0
}

function toDegrees([longitude, latitude]: Position): Position {
  return [longitude / STEPS_PER_DEGREE, latitude / STEPS_PER_DEGREE]
}

function isSame(one: Position | undefined, other: Position | undefined): boolean {
  return one !== undefined && other !== undefined && one[0] === other[0] && one[1] === other[1]
}
