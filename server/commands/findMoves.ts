import type { Scope } from '@/server/database'
import { unusable } from '@/server/errors'
import type { BuildingMove } from './moveBuildings'

/**
 * Which buildings of a round must move so that a beat holds exactly the named outlines.
 *
 * @throws {Refusal} `input-not-usable`, naming each outline that is not in the frame
 */
export async function findMoves(
  scope: Scope,
  { roundId, beatId, outlineIds }: { roundId: string; beatId: string; outlineIds: readonly string[] },
): Promise<BuildingMove[]> {
  const frame = await scope.select<{ building_id: string; outline_id: string; beat_id: string | null }>(
    `SELECT building_id, outline_id, beat_id FROM round_building
     WHERE organisation_id = $organisationId AND round_id = $roundId ORDER BY change_no`,
    { organisationId: scope.organisationId, roundId },
  )
  const known = new Set(frame.map(({ outline_id }) => outline_id))
  const faults = outlineIds.flatMap((outlineId, position) =>
    known.has(outlineId)
      ? []
      : [
          {
            pointer: `/body/outlineIds/${position}`,
            code: 'not-in-frame',
            detail: 'the outline is not in the frame of this round',
          },
        ],
  )
  if (faults.length > 0) {
    throw unusable('Some outlines are not in the frame of this round. Nothing was changed; choose others.', faults)
  }
  const wanted = new Set(outlineIds)
  return frame.flatMap(({ building_id, outline_id, beat_id }) => {
    const toBeatId = wanted.has(outline_id) ? beatId : beat_id === beatId ? null : beat_id
    return toBeatId === beat_id ? [] : [{ buildingId: building_id, fromBeatId: beat_id, toBeatId }]
  })
}
