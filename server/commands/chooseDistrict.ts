import { randomUUID } from 'node:crypto'
import type { Scope } from '@/server/database'
import { conflictWith, notFound } from '@/server/errors'

/**
 * A district that is there, locked against other imports, or a new one by name.
 *
 * @returns its id
 * @throws {Refusal} `not-found`, `district-name-taken`
 */
export async function chooseDistrict(scope: Scope, wish: { districtId: string } | { name: string }): Promise<string> {
  const { organisationId } = scope
  if ('districtId' in wish) {
    const [row] = await scope.select(
      `SELECT district_id FROM district
       WHERE organisation_id = $organisationId AND district_id = $districtId FOR UPDATE`,
      { organisationId, districtId: wish.districtId },
    )
    if (!row) throw notFound('district')
    return wish.districtId
  }
  const [row] = await scope.select<{ district_id: string }>(
    `INSERT INTO district (organisation_id, district_id, name) VALUES ($organisationId, $districtId, $name)
     ON CONFLICT (organisation_id, lower(name)) DO NOTHING RETURNING district_id`,
    { organisationId, districtId: randomUUID(), name: wish.name },
  )
  if (row) return row.district_id
  throw conflictWith(
    'district-name-taken',
    `There is a district named ${wish.name} already. Nothing was changed; choose it, or take another name.`,
  )
}
