import { ComputeError } from '@/shared/compute/errors'
import type { MassGroup } from './massGroup.types'

/**
 * Chances of the buildings of a group to be part of the figure, when their life is z standard errors off.
 *
 * @param z standard errors of the life [–]
 * @returns chances [–], null where the group is counted whole
 * @throws {ComputeError} `length-mismatch`, `share-out-of-range`
 * @example
 * chancesOf({ factors: [], areasM2: [100], areaCv: 0, comingDown: [0.2] }, 0) // => [0.2]
 */
export function chancesOf({ areasM2, comingDown }: MassGroup, z: number): ArrayLike<number> | null {
  if (comingDown === undefined) return null
  const chances = 'chancesAt' in comingDown ? comingDown.chancesAt(z) : comingDown
  if (chances.length !== areasM2.length)
    throw new ComputeError('length-mismatch', { areas: areasM2.length, chances: chances.length })
  for (let i = 0; i < chances.length; i++) {
    const chance = chances[i]!
    if (!(chance >= 0 && chance <= 1)) throw new ComputeError('share-out-of-range', { chance })
  }
  return chances
}
