import type { Scope } from '@/server/database'
import { curvatureRadii } from '@/shared/compute/spatial/curvatureRadii'

/** Gap [m] that a block bridges: closer buildings belong together, a street is wider. */
const GAP_M = 6
/** A block of more outlines than this is cut into parts of about {@link PART}, so that a beat can be shared out. */
const LARGEST = 60
const PART = 40
/** A block is drawn a little wider than its walls, with corners as sharp as theirs. */
const RIM_M = 0.5
const CORNERS = 'join=mitre mitre_limit=2'

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
       SELECT outline_id, ST_TransScale(geometry, -$west::float8, -$south::float8, $eastM::float8, $northM::float8) AS g FROM outline
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
       SELECT gen_random_uuid() AS block_id, array_agg(outline_id) AS outline_ids,
         ST_Buffer(ST_Buffer(ST_Collect(g), $gapM::float8 / 2 + $rimM::float8, $corners), -$gapM::float8 / 2, $corners) AS area
       FROM cut GROUP BY cluster, part
     ), named AS (
       SELECT *, row_number() OVER (
         ORDER BY -round(ST_Y(ST_Centroid(area)) / 100), ST_X(ST_Centroid(area))
       ) + (SELECT count(*) FROM block WHERE organisation_id = $organisationId AND district_id = $districtId) AS number
       FROM drawn
     ), made AS (
       INSERT INTO block (organisation_id, block_id, district_id, name, geometry)
       SELECT $organisationId, block_id, $districtId, 'Block ' || number,
         ST_Multi(ST_Translate(ST_Scale(area, 1 / $eastM::float8, 1 / $northM::float8), $west::float8, $south::float8))
       FROM named RETURNING block_id
     ), placed AS (
       UPDATE outline o SET block_id = member.block_id
       FROM (SELECT block_id, unnest(outline_ids) AS outline_id FROM named) AS member
       WHERE o.organisation_id = $organisationId AND o.outline_id = member.outline_id
     )
     SELECT block_id FROM made`,
    {
      organisationId,
      districtId,
      importId: importId ?? null,
      ...plane,
      gapM: GAP_M,
      rimM: RIM_M,
      corners: CORNERS,
      largest: LARGEST,
      part: PART,
    },
  )
  return rows.length
}

/** A plane of metres that touches the Earth in the middle of a district: its origin and its metres a degree. */
async function localPlane(scope: Scope, districtId: string) {
  const [middle] = await scope.select<{ longitude: number; latitude: number }>(
    `SELECT ST_X(c) AS longitude, ST_Y(c) AS latitude
     FROM (SELECT ST_Centroid(ST_Collect(inner_point)) AS c FROM outline
           WHERE organisation_id = $organisationId AND district_id = $districtId) AS middle`,
    { organisationId: scope.organisationId, districtId },
  )
  const { longitude, latitude } = middle ?? { longitude: 0, latitude: 0 }
  const { meridionalM, primeVerticalM } = curvatureRadii(latitude)
  const perDegree = Math.PI / 180
  return {
    west: longitude,
    south: latitude,
    eastM: primeVerticalM * Math.cos(latitude * perDegree) * perDegree,
    northM: meridionalM * perDegree,
  }
}
