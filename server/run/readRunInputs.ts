import type { Scope } from '@/server/database'
import { sheetAnswers } from '@/shared/schemas/sheet'
import { sliceSheet } from '@/shared/schemas/sliceSheet'
import type { FrameCounts, RunSheet } from './runInputs.types'

interface SheetRow {
  sheet_id: string
  outline_id: string | null
  block_id: string | null
  reference: string | null
  street: string | null
  house_number: string | null
  use: RunSheet['use']
  structure: RunSheet['structure']
  year_from: number | null
  year_to: number | null
  footprint_m2: number
  gross_floor_area_m2: number
  floor_area_cv: number
  storeys: number | null
  condition: string | null
  vacancy: string | null
  is_protected: boolean | null
  /** The answers, where there are several uses or parts. */
  composed: unknown
}

/** The checked sheets of a round that record a standing building, as they stand now, in the order of their ids. */
export async function readCheckedSheets(scope: Scope, roundId: string): Promise<RunSheet[]> {
  const rows = await scope.select<SheetRow>(
    `SELECT s.sheet_id, s.outline_id, o.block_id, o.reference, o.street, o.house_number, s.use, s.structure, s.year_from, s.year_to,
            s.footprint_m2, s.gross_floor_area_m2, s.floor_area_cv,
            (s.answers #>> '{storeys,aboveGround}')::double precision AS storeys,
            s.answers #>> '{condition,condition}' AS condition,
            s.answers #>> '{vacancy,vacancy}' AS vacancy,
            (s.answers #>> '{protection,isProtected}')::boolean AS is_protected,
            CASE WHEN jsonb_array_length(coalesce(s.answers #> '{parts,parts}', '[]')) > 0
                   OR jsonb_array_length(coalesce(s.answers #> '{use,otherUses}', '[]')) > 0 THEN s.answers END AS composed
     FROM sheet s
     LEFT JOIN outline o ON o.organisation_id = s.organisation_id AND o.outline_id = s.outline_id
     WHERE s.organisation_id = $organisationId AND s.round_id = $roundId AND s.state = 'checked' AND s.deleted_at IS NULL
       AND s.finding = 'standing' AND s.gross_floor_area_m2 > 0
     ORDER BY s.sheet_id`,
    { organisationId: scope.organisationId, roundId },
  )
  return rows.map(toRunSheet)
}

function toRunSheet(row: SheetRow): RunSheet {
  return {
    buildingId: row.sheet_id,
    outlineId: row.outline_id,
    blockId: row.block_id,
    label: labelOf(row),
    use: row.use,
    structure: row.structure,
    yearFrom: row.year_from,
    yearTo: row.year_to,
    footprintM2: row.footprint_m2,
    grossFloorAreaM2: row.gross_floor_area_m2,
    floorAreaCv: row.floor_area_cv,
    isStoreysKnown: row.storeys !== null,
    condition: row.condition ?? 'unknown',
    vacancy: row.vacancy ?? 'unknown',
    isProtected: row.is_protected ?? false,
    ...(row.composed ? { slices: sliceSheet(sheetAnswers.parse(row.composed)) } : {}),
  }
}

function labelOf({ street, house_number, reference, sheet_id }: SheetRow): string {
  return [street, house_number].filter(Boolean).join(' ') || (reference ?? sheet_id.slice(0, 8))
}

/**
 * How the frame of a round stands: what is outstanding is counted here and never as zero mass. Areas are added as exact
 * decimals, because a sum of doubles depends on the order the database reads its rows in, and equal inputs must be equal.
 */
export async function readFrameCounts(scope: Scope, roundId: string): Promise<FrameCounts> {
  const [row] = await scope.select<FrameCounts>(
    `SELECT count(*)::integer AS "frameCount",
            (count(*) FILTER (WHERE s.finding = 'inaccessible'))::integer AS "inaccessibleCount",
            (count(*) FILTER (WHERE s.finding = 'not-a-building'))::integer AS "notABuildingCount",
            (count(*) FILTER (WHERE s.finding = 'cleared'))::integer AS "clearedCount",
            (count(*) FILTER (WHERE s.sheet_id IS NULL))::integer AS "outstandingCount",
            coalesce(sum(o.footprint_m2::numeric) FILTER (WHERE s.finding IS NULL OR s.finding NOT IN ('cleared', 'not-a-building')), 0)::double precision AS "frameFootprintM2"
     FROM round_building b
     JOIN outline o ON o.organisation_id = b.organisation_id AND o.outline_id = b.outline_id
     LEFT JOIN sheet s ON s.organisation_id = b.organisation_id AND s.sheet_id = b.building_id AND s.state = 'checked' AND s.deleted_at IS NULL
     WHERE b.organisation_id = $organisationId AND b.round_id = $roundId`,
    { organisationId: scope.organisationId, roundId },
  )
  if (!row) throw new Error('a count always answers')
  return row
}
