import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { notFound, Refusal, unusable } from '@/server/errors'
import { judgeGeometry } from '@/server/outlines/judgeGeometry'
import { readDistricts } from '@/server/queries/readDistricts'
import type { District } from '@/shared/api/outlines'
import type { PolygonGeometry } from '@/shared/schemas/primitives'
import { chooseDistrict } from './chooseDistrict'
import { clusterBlocks } from './clusterBlocks'
import { recordAudit } from './recordAudit'

/**
 * Makes a district from a drawn outline. It takes over every outline whose inner point lies in it; rounds that were
 * opened before keep their frame. Blocks are gathered anew among what it took.
 *
 * @throws {Refusal} `input-not-usable`, `district-name-taken`, `district-without-outlines`
 */
export async function drawDistrict(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  { name, geometry }: { name: string; geometry: PolygonGeometry },
): Promise<District> {
  const judged = judgeGeometry(geometry, undefined)
  if ('fault' in judged) {
    throw unusable('The drawn outline does not enclose a district. Nothing was changed; draw it again.', [
      { pointer: '/body/geometry', code: judged.fault, detail: `the outline is ${judged.fault}` },
    ])
  }
  const drawn = JSON.stringify(judged.geometry)
  return database.withScope(actor, async (scope) => {
    const districtId = await chooseDistrict(scope, { name })
    const taken = await takeOutlines(scope, districtId, drawn)
    if (taken === 0) throw withoutOutlines()
    await clusterBlocks(scope, { districtId })
    await recordAudit(scope, {
      action: 'district-drawn',
      subjectType: 'district',
      subjectId: districtId,
      detail: { outlineCount: taken },
    })
    const [district] = await readDistricts(scope, districtId)
    if (!district) throw notFound('district')
    return district
  })
}

async function takeOutlines(scope: Scope, districtId: string, drawn: string): Promise<number> {
  const { organisationId } = scope
  await scope.execute(
    `UPDATE district SET geometry = ST_Multi(ST_SetSRID(ST_GeomFromGeoJSON($drawn), 4326))
     WHERE organisation_id = $organisationId AND district_id = $districtId`,
    { organisationId, districtId, drawn },
  )
  // Two districts may hold the same reference; the second one to come gets its count behind it.
  const rows = await scope.select(
    `WITH inside AS (
       SELECT o.outline_id, o.reference,
         row_number() OVER (PARTITION BY o.reference ORDER BY o.district_id, o.outline_id) AS turn
       FROM outline o
       WHERE o.organisation_id = $organisationId
         AND ST_Covers(ST_SetSRID(ST_GeomFromGeoJSON($drawn), 4326), o.inner_point)
     )
     UPDATE outline o SET district_id = $districtId, block_id = NULL,
       reference = CASE WHEN turn = 1 THEN inside.reference ELSE inside.reference || ' (' || turn || ')' END
     FROM inside WHERE o.organisation_id = $organisationId AND o.outline_id = inside.outline_id
     RETURNING o.outline_id`,
    { organisationId, districtId, drawn },
  )
  await scope.execute(
    `DELETE FROM block b WHERE b.organisation_id = $organisationId AND NOT EXISTS (
       SELECT FROM outline o WHERE o.organisation_id = b.organisation_id AND o.block_id = b.block_id)`,
    { organisationId },
  )
  return rows.length
}

const withoutOutlines = () =>
  new Refusal(
    422,
    'district-without-outlines',
    'No outline lies in the drawn district. Nothing was changed; import outlines first, or draw around some.',
  )
