import type { Scope } from '@/server/database'
import type { Attributes } from '@/server/outlines/outlines.types'
import type { RegisterEntry } from '@/server/outlines/readRegister'
import type { AreaGeometry } from '@/shared/schemas/primitives'

const ROWS_A_STATEMENT = 5_000

/** An outline on its way into a district. */
export interface NewOutline extends Omit<RegisterEntry, 'reference'> {
  readonly outlineId: string
  readonly reference: string
  readonly footprintM2: number
  readonly geometry: AreaGeometry
  readonly innerPoint: readonly [longitude: number, latitude: number]
  readonly attributes: Attributes
}

/** Inserts outlines set by set, one JSON parameter a set, and draws the district's hull around all it has. */
export async function insertOutlines(
  scope: Scope,
  { districtId, importId, outlines }: { districtId: string; importId: string; outlines: readonly NewOutline[] },
): Promise<void> {
  const { organisationId } = scope
  for (let start = 0; start < outlines.length; start += ROWS_A_STATEMENT) {
    await scope.execute(
      `INSERT INTO outline (organisation_id, outline_id, district_id, import_id, reference, street, house_number,
         footprint_m2, register_year, register_storeys, register_height_m, register_use, attributes, geometry, inner_point)
       SELECT $organisationId, r."outlineId", $districtId, $importId, r.reference, r.street, r."houseNumber",
         r."footprintM2", r.year, r.storeys, r."heightM", r.use, r.attributes,
         ST_Multi(ST_SetSRID(ST_GeomFromGeoJSON(r.geometry), 4326)),
         ST_SetSRID(ST_MakePoint((r."innerPoint" ->> 0)::float8, (r."innerPoint" ->> 1)::float8), 4326)
       FROM json_to_recordset($rows::json) AS r("outlineId" uuid, reference text, street text, "houseNumber" text,
         "footprintM2" float8, year integer, storeys float8, "heightM" float8, use text, attributes jsonb,
         geometry json, "innerPoint" json)`,
      {
        organisationId,
        districtId,
        importId,
        rows: JSON.stringify(outlines.slice(start, start + ROWS_A_STATEMENT)),
      },
    )
  }
  await scope.execute(
    `UPDATE district d SET geometry = (
       SELECT ST_Multi(ST_ConvexHull(ST_Collect(o.geometry))) FROM outline o
       WHERE o.organisation_id = d.organisation_id AND o.district_id = d.district_id)
     WHERE d.organisation_id = $organisationId AND d.district_id = $districtId`,
    { organisationId, districtId },
  )
}
