import type { Scope } from '@/server/database'
import type { District } from '@/shared/api/outlines'

interface DistrictRow {
  district_id: string
  name: string
  outline_count: number
  block_count: number
  footprint_m2: number
  west: number | null
  south: number | null
  east: number | null
  north: number | null
}

/** The districts of the organisation by name, or the one asked for. */
export async function readDistricts(scope: Scope, districtId?: string): Promise<District[]> {
  const rows = await scope.select<DistrictRow>(
    `SELECT d.district_id, d.name, coalesce(o.outline_count, 0)::integer AS outline_count,
       (SELECT count(*) FROM block b
        WHERE b.organisation_id = d.organisation_id AND b.district_id = d.district_id)::integer AS block_count,
       coalesce(o.footprint_m2, 0) AS footprint_m2,
       ST_XMin(o.box) AS west, ST_YMin(o.box) AS south, ST_XMax(o.box) AS east, ST_YMax(o.box) AS north
     FROM district d
     LEFT JOIN (
       SELECT district_id, count(*) AS outline_count, sum(footprint_m2) AS footprint_m2, ST_Extent(geometry) AS box
       FROM outline WHERE organisation_id = $organisationId GROUP BY district_id
     ) o USING (district_id)
     WHERE d.organisation_id = $organisationId AND ($districtId::uuid IS NULL OR d.district_id = $districtId::uuid)
     ORDER BY lower(d.name)`,
    { organisationId: scope.organisationId, districtId: districtId ?? null },
  )
  return rows.map(presentDistrict)
}

function presentDistrict({ west, south, east, north, ...row }: DistrictRow): District {
  const hasBox = west !== null && south !== null && east !== null && north !== null
  return {
    districtId: row.district_id,
    name: row.name,
    outlineCount: row.outline_count,
    blockCount: row.block_count,
    footprintM2: row.footprint_m2,
    boundingBox: hasBox ? [west, south, east, north] : null,
  } satisfies District
}
