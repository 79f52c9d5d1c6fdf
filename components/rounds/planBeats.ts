import type { Position } from '@/shared/compute/spatial/spatial.types'
import { sum } from '@/shared/compute/sum'
import { shareOutByWalk } from '@/shared/compute/survey/shareOutByWalk'
import { walkLength } from '@/shared/compute/survey/walkLength'
import type { OutlineCollection } from '@/shared/schemas/outline'
import { innerPoint } from './innerPoint'

/** A beat that is proposed, not made. */
export interface PlannedBeat {
  readonly outlineIds: readonly string[]
  readonly footprintM2: number
  /** From door to door as the crow flies [m]. */
  readonly walkM: number
}

/**
 * Proposes beats for buildings: blocks stay whole, neighbours together, and each beat has about as many buildings.
 *
 * @param outlines outlines of the district
 * @param freeIds those without a beat
 * @param wantedCount number of beats; fewer come where there are fewer blocks
 * @returns one plan a beat, none empty; none when nothing is free
 */
export function planBeats(
  outlines: OutlineCollection['features'],
  freeIds: ReadonlySet<string>,
  wantedCount: number,
): PlannedBeat[] {
  const free = outlines
    .filter(({ id }) => freeIds.has(id))
    .map(({ id, geometry, properties }) => ({ id, point: innerPoint(geometry), ...properties }))
  const byBlock = new Map<string, typeof free>()
  for (const building of free) {
    const key = building.blockId ?? building.id
    byBlock.set(key, [...(byBlock.get(key) ?? []), building])
  }
  const blocks = [...byBlock.values()]
  if (blocks.length === 0) return []
  const parts = blocks.map((block) => ({ position: middleOf(block.map(({ point }) => point)), load: block.length }))
  return shareOutByWalk(parts, Math.min(wantedCount, parts.length)).map((beat) => {
    const buildings = beat.flatMap((index) => blocks[index] ?? [])
    return {
      outlineIds: buildings.map(({ id }) => id),
      footprintM2: sum(buildings.map(({ footprintM2 }) => footprintM2)),
      walkM: walkLength(buildings.map(({ point }) => point)),
    }
  })
}

/** Within a block, degrees may be averaged. */
function middleOf(points: readonly Position[]): Position {
  const mean = (axis: 0 | 1): number => sum(points.map((point) => point[axis])) / points.length
  return [mean(0), mean(1)]
}
