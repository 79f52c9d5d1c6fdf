import type { Scope } from '@/server/database'
import type { Position } from '@/shared/compute/spatial/spatial.types'

/** A position of the organisation's newest outlines [°], if it has any. */
export async function knownPosition(scope: Scope): Promise<Position | undefined> {
  const [row] = await scope.select<{ longitude: number; latitude: number }>(
    `SELECT ST_X(o.inner_point) AS longitude, ST_Y(o.inner_point) AS latitude
     FROM outline o JOIN district d USING (organisation_id, district_id)
     WHERE o.organisation_id = $organisationId ORDER BY d.created_at DESC LIMIT 1`,
    { organisationId: scope.organisationId },
  )
  return row ? [row.longitude, row.latitude] : undefined
}
