import type { z } from 'zod'
import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import { OUTLINE_COLUMNS, OUTLINE_GEOMETRY, presentOutline, type OutlineRow } from '@/server/presenters/presentOutline'
import type { blockCollection, OutlineCollection } from '@/shared/schemas/outline'
import type { AreaGeometry } from '@/shared/schemas/primitives'

/** Outlines of a district as GeoJSON, by reference. @throws {Refusal} `not-found` */
export async function readDistrictOutlines(scope: Scope, districtId: string): Promise<OutlineCollection> {
  await requireDistrict(scope, districtId)
  const rows = await scope.select<OutlineRow & { geometry: AreaGeometry }>(
    `SELECT ${OUTLINE_COLUMNS}, ${OUTLINE_GEOMETRY} AS geometry FROM outline o
     WHERE o.organisation_id = $organisationId AND o.district_id = $districtId ORDER BY o.reference`,
    { organisationId: scope.organisationId, districtId },
  )
  return {
    type: 'FeatureCollection',
    features: rows.map(({ geometry, ...row }) => ({
      type: 'Feature',
      id: row.outline_id,
      geometry,
      properties: presentOutline(row),
    })),
  }
}

/** Blocks of a district as GeoJSON, with how many outlines each has. @throws {Refusal} `not-found` */
export async function readDistrictBlocks(scope: Scope, districtId: string): Promise<z.infer<typeof blockCollection>> {
  await requireDistrict(scope, districtId)
  const rows = await scope.select<{ block_id: string; name: string; outline_count: number; geometry: AreaGeometry }>(
    `SELECT b.block_id, b.name, ST_AsGeoJSON(b.geometry, 7)::json AS geometry,
       (SELECT count(*) FROM outline o
        WHERE o.organisation_id = b.organisation_id AND o.block_id = b.block_id)::integer AS outline_count
     FROM block b
     WHERE b.organisation_id = $organisationId AND b.district_id = $districtId
     ORDER BY length(b.name), b.name`,
    { organisationId: scope.organisationId, districtId },
  )
  return {
    type: 'FeatureCollection',
    features: rows.map((row) => ({
      type: 'Feature',
      id: row.block_id,
      geometry: row.geometry,
      properties: { blockId: row.block_id, name: row.name, outlineCount: row.outline_count },
    })),
  }
}

async function requireDistrict(scope: Scope, districtId: string): Promise<void> {
  const [row] = await scope.select(
    'SELECT district_id FROM district WHERE organisation_id = $organisationId AND district_id = $districtId',
    { organisationId: scope.organisationId, districtId },
  )
  if (!row) throw notFound('district')
}
