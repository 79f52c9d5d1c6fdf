import type { Scope } from '@/server/database'
import type { LookRow } from '@/server/run/lookFrame.types'

/** All buildings of a round as they are known now: outline, register, and what a sheet of any state says. */
export function readLookFrame(scope: Scope, roundId: string): Promise<LookRow[]> {
  return scope.select<LookRow>(
    `SELECT b.building_id AS "buildingId", b.outline_id AS "outlineId", b.beat_id AS "beatId", o.reference, o.street,
            o.house_number AS "houseNumber", o.footprint_m2 AS "outlineFootprintM2", o.register_year AS "registerYear",
            o.register_storeys AS "registerStoreys", o.register_use AS "registerUse", s.state, s.finding, s.use, s.structure,
            s.year_from AS "yearFrom", s.year_to AS "yearTo", s.footprint_m2 AS "footprintM2",
            s.gross_floor_area_m2 AS "grossFloorAreaM2", s.floor_area_cv AS "floorAreaCv",
            coalesce(s.answers #>> '{condition,condition}', 'unknown') AS condition,
            coalesce(s.answers #>> '{vacancy,vacancy}', 'unknown') AS vacancy,
            coalesce((s.answers #>> '{protection,isProtected}')::boolean, false) AS "isProtected"
     FROM round_building b
     JOIN outline o ON o.organisation_id = b.organisation_id AND o.outline_id = b.outline_id
     LEFT JOIN sheet s ON s.organisation_id = b.organisation_id AND s.sheet_id = b.building_id AND s.deleted_at IS NULL
     WHERE b.organisation_id = $organisationId AND b.round_id = $roundId
     ORDER BY b.building_id`,
    { organisationId: scope.organisationId, roundId },
  )
}
