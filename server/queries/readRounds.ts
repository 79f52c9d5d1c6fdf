import type { Scope } from '@/server/database'
import { COVERAGE_COLUMNS, presentRound, type RoundRow } from '@/server/presenters/presentRound'
import type { Round } from '@/shared/api/rounds'

/** All rounds with their coverage, newest first, or the one asked for. */
export async function readRounds(scope: Scope, roundId?: string): Promise<Round[]> {
  const rows = await scope.select<RoundRow>(
    `WITH frame AS (
       SELECT b.round_id, o.footprint_m2, s.state
       FROM round_building b
       JOIN outline o ON o.organisation_id = b.organisation_id AND o.outline_id = b.outline_id
       LEFT JOIN sheet s ON s.organisation_id = b.organisation_id AND s.sheet_id = b.building_id AND s.deleted_at IS NULL
       WHERE b.organisation_id = $organisationId AND ($roundId::uuid IS NULL OR b.round_id = $roundId::uuid)
     ), covered AS (
       SELECT round_id, ${COVERAGE_COLUMNS}, sum(footprint_m2) AS footprint_m2,
         sum(footprint_m2) FILTER (WHERE state IN ('handed-in', 'checked')) AS recorded_footprint_m2
       FROM frame GROUP BY round_id
     )
     SELECT r.round_id, r.name, r.district_id, d.name AS district_name,
       r.starts_on::text AS starts_on, r.ends_on::text AS ends_on, covered.building_count, covered.to_do_count,
       covered.handed_in_count, covered.checked_count, covered.sent_back_count, covered.footprint_m2,
       covered.recorded_footprint_m2
     FROM round r
     JOIN district d ON d.organisation_id = r.organisation_id AND d.district_id = r.district_id
     LEFT JOIN covered ON covered.round_id = r.round_id
     WHERE r.organisation_id = $organisationId AND ($roundId::uuid IS NULL OR r.round_id = $roundId::uuid)
     ORDER BY r.starts_on DESC, r.created_at DESC`,
    { organisationId: scope.organisationId, roundId: roundId ?? null },
  )
  return rows.map(presentRound)
}
