import { randomUUID } from 'node:crypto'
import type { TestApp } from './createTestApp'

export interface TestDistrict {
  readonly organisationId: string
  readonly districtId: string
  /** In the order of their references: R-0001, R-0002, … */
  readonly outlineIds: readonly string[]
}

/** West and south corner of the first outline [°]: open country, nobody's town. */
const CORNER = [16.3, 48.1] as const
const STEP_DEG = 0.000_4
const SIDE_DEG = 0.000_15

/** A district of square outlines in rows of ten, about 11 m × 17 m each, with a register year and two storeys. */
export async function buildDistrict(
  { owner }: Pick<TestApp, 'owner'>,
  { organisationId, name, outlineCount = 4 }: { organisationId: string; name?: string; outlineCount?: number },
): Promise<TestDistrict> {
  const districtId = randomUUID()
  await owner.run(
    'INSERT INTO district (organisation_id, district_id, name) VALUES ($organisationId, $districtId, $name)',
    {
      organisationId,
      districtId,
      name: name ?? `District ${districtId.slice(0, 8)}`,
    },
  )
  const outlines = Array.from({ length: outlineCount }, (_, index) => ({
    outline_id: randomUUID(),
    reference: `R-${String(index + 1).padStart(4, '0')}`,
    west: CORNER[0] + (index % 10) * STEP_DEG,
    south: CORNER[1] + Math.floor(index / 10) * STEP_DEG,
  }))
  await owner.run(
    `INSERT INTO outline (organisation_id, outline_id, district_id, reference, street, house_number, footprint_m2,
       register_year, register_storeys, register_height_m, register_use, geometry, inner_point)
     SELECT $organisationId, o.outline_id, $districtId, o.reference, 'Ferry Lane', o.number::text,
       ST_Area(g.square::geography), 1930, 2, 7.5, 'terraced', ST_Multi(g.square), ST_Centroid(g.square)
     FROM (
       SELECT row_number() OVER () AS number, *
       FROM json_to_recordset($outlines::json) AS r(outline_id uuid, reference text, west float8, south float8)
     ) o, LATERAL (SELECT ST_MakeEnvelope(o.west, o.south, o.west + $side, o.south + $side, 4326) AS square) g`,
    { organisationId, districtId, outlines: JSON.stringify(outlines), side: SIDE_DEG },
  )
  return { organisationId, districtId, outlineIds: outlines.map(({ outline_id }) => outline_id) }
}
