import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import { COVERAGE_COLUMNS, presentBeat, type BeatRow } from '@/server/presenters/presentRound'
import type { RoundWithBeats } from '@/shared/api/rounds'
import type { SheetState } from '@/shared/schemas/sheet'
import { readRounds } from './readRounds'

/** One round with its beats by name and its frame. @throws {Refusal} `not-found` */
export async function readRound(scope: Scope, roundId: string): Promise<RoundWithBeats> {
  const [round] = await readRounds(scope, roundId)
  if (!round) throw notFound('round')
  const bind = { organisationId: scope.organisationId, roundId }
  const beats = await scope.select<BeatRow>(
    `WITH covered AS (
       SELECT b.beat_id, ${COVERAGE_COLUMNS}
       FROM round_building b
       LEFT JOIN sheet s ON s.organisation_id = b.organisation_id AND s.sheet_id = b.building_id AND s.deleted_at IS NULL
       WHERE b.organisation_id = $organisationId AND b.round_id = $roundId AND b.beat_id IS NOT NULL
       GROUP BY b.beat_id
     )
     SELECT t.beat_id, t.name, t.surveyor_id, p.name AS surveyor_name, covered.building_count, covered.to_do_count,
       covered.handed_in_count, covered.checked_count, covered.sent_back_count
     FROM beat t
     LEFT JOIN person p ON p.organisation_id = t.organisation_id AND p.person_id = t.surveyor_id
     LEFT JOIN covered ON covered.beat_id = t.beat_id
     WHERE t.organisation_id = $organisationId AND t.round_id = $roundId AND t.deleted_at IS NULL
     ORDER BY lower(t.name), t.beat_id`,
    bind,
  )
  const buildings = await scope.select<{
    building_id: string
    outline_id: string
    beat_id: string | null
    state: SheetState | null
  }>(
    `SELECT b.building_id, b.outline_id, b.beat_id, s.state
     FROM round_building b
     LEFT JOIN sheet s ON s.organisation_id = b.organisation_id AND s.sheet_id = b.building_id AND s.deleted_at IS NULL
     WHERE b.organisation_id = $organisationId AND b.round_id = $roundId ORDER BY b.building_id`,
    bind,
  )
  return {
    ...round,
    beats: beats.map(presentBeat),
    buildings: buildings.map((row) => ({
      buildingId: row.building_id,
      outlineId: row.outline_id,
      beatId: row.beat_id,
      state: row.state ?? 'to-do',
    })),
  } satisfies RoundWithBeats
}
