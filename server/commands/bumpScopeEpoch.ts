import type { Scope } from '@/server/database'

/** Tells the devices of some people that their beats are others than before. Null and repeats are passed over. */
export async function bumpScopeEpoch(scope: Scope, personIds: readonly (string | null)[]): Promise<void> {
  const concerned = [...new Set(personIds)].filter((personId) => personId !== null)
  if (concerned.length === 0) return
  await scope.execute(
    `UPDATE person SET scope_epoch = scope_epoch + 1
     WHERE organisation_id = $organisationId
       AND person_id IN (SELECT value::uuid FROM json_array_elements_text($ids::json))`,
    { organisationId: scope.organisationId, ids: JSON.stringify(concerned) },
  )
}
