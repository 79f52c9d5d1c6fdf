import type { Scope } from '@/server/database'

/** Gap [m] that a block bridges: closer buildings belong together, a street is wider. */
const GAP_M = 8
/** A block of more outlines than this is cut into parts of about {@link PART}, so that a beat can be shared out. */
const LARGEST = 60
const PART = 40

/**
 * Gathers outlines that have no block yet into blocks: neighbours in a plane of metres around the district, numbered
 * from north to south and west to east after the blocks that are there.
 *
 * @param importId only the outlines of one import; all of the district when absent
 * @returns number of blocks made
 */
export async function clusterBlocks(
  scope: Scope,
  { districtId, importId }: { districtId: string; importId?: string },
): Promise<number> {
  const { organisationId } = scope
  const plane = await localPlane(scope, districtId)
  const rows = await scope.select<{ block_id: string }>(
    `WITH plane AS (
       SELECT outline_id, ST_Transform(geometry, $plane) AS g FROM outline
       WHERE organisation_id = $organisationId AND district_id = $districtId AND block_id IS NULL
         AND ($importId::uuid IS NULL OR import_id = $importId::uuid)
     ), gathered AS (
       SELECT outline_id, g, ST_ClusterDBSCAN(g, $gapM, 1) OVER () AS cluster FROM plane
     ), counted AS (
       SELECT *, count(*) OVER (PARTITION BY cluster) AS n FROM gathered
     ), cut AS (
       SELECT outline_id, g, cluster,
         ST_ClusterKMeans(ST_Centroid(g), CASE WHEN n > $largest THEN ceil(n::float8 / $part)::integer ELSE 1 END)
           OVER (PARTITION BY cluster) AS part
       FROM counted
     ), drawn AS (
       SELECT gen_random_uuid() AS block_id, cluster, part,
         ST_Buffer(ST_Buffer(ST_Collect(g), $gapM / 2 + 0.5, 'quad_segs=2'), -$gapM / 2, 'quad_segs=2') AS area
       FROM cut GROUP BY cluster, part
     ), named AS (
       SELECT *, row_number() OVER (
         ORDER BY -round(ST_Y(ST_Centroid(area)) / 100), ST_X(ST_Centroid(area))
       ) + (SELECT count(*) FROM block WHERE organisation_id = $organisationId AND district_id = $districtId) AS number
       FROM drawn
     ), made AS (
       INSERT INTO block (organisation_id, block_id, district_id, name, geometry)
       SELECT $organisationId, block_id, $districtId, 'Block ' || number,
         ST_Multi(ST_Transform(ST_SetSRID(area, 0), $plane, 4326))
       FROM named RETURNING block_id
     ), placed AS (
       UPDATE outline o SET block_id = named.block_id
       FROM cut JOIN named ON named.cluster = cut.cluster AND named.part = cut.part
       WHERE o.organisation_id = $organisationId AND o.outline_id = cut.outline_id
     )
     SELECT block_id FROM made`,
    { organisationId, districtId, importId: importId ?? null, plane, gapM: GAP_M, largest: LARGEST, part: PART },
  )
  return rows.length
}

/** An equal-area plane of metres around the middle of a district, true to length within it. */
async function localPlane(scope: Scope, districtId: string): Promise<string> {
  const [middle] = await scope.select<{ longitude: number; latitude: number }>(
    `SELECT ST_X(c) AS longitude, ST_Y(c) AS latitude
     FROM (SELECT ST_Centroid(ST_Collect(inner_point)) AS c FROM outline
           WHERE organisation_id = $organisationId AND district_id = $districtId) AS middle`,
    { organisationId: scope.organisationId, districtId },
  )
  const { longitude, latitude } = middle ?? { longitude: 0, latitude: 0 }
  return `+proj=laea +lat_0=${latitude.toFixed(6)} +lon_0=${longitude.toFixed(6)} +datum=WGS84 +units=m +no_defs`
}
