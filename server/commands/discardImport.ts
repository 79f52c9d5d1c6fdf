import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { readStagedFeatures } from '@/server/queries/readStagedFeatures'

/** Throws a waiting file away. @throws {Refusal} `not-found`, `import-settled` */
export async function discardImport(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  importId: string,
): Promise<void> {
  await database.withScope(actor, async (scope) => {
    await readStagedFeatures(scope, importId, { lock: true })
    await scope.execute(
      `UPDATE outline_import SET state = 'discarded', features = NULL
       WHERE organisation_id = $organisationId AND import_id = $importId`,
      { organisationId: scope.organisationId, importId },
    )
  })
}
