import { z } from 'zod'
import type { Scope } from '@/server/database'
import { conflictWith, notFound } from '@/server/errors'
import type { UsableFeature } from '@/server/outlines/outlines.types'

const stored = z.array(z.custom<UsableFeature>((value) => typeof value === 'object' && value !== null))

/**
 * The usable features of a file that still waits.
 *
 * @param options.lock keeps the file from being imported or discarded by somebody else meanwhile
 * @throws {Refusal} `not-found`, `import-settled`
 */
export async function readStagedFeatures(
  scope: Scope,
  importId: string,
  { lock = false }: { lock?: boolean } = {},
): Promise<{ features: UsableFeature[]; featureCount: number }> {
  const [row] = await scope.select<{ state: string; features: unknown; feature_count: number }>(
    `SELECT state, features, (staged ->> 'featureCount')::integer AS feature_count FROM outline_import
     WHERE organisation_id = $organisationId AND import_id = $importId ${lock ? 'FOR UPDATE' : ''}`,
    { organisationId: scope.organisationId, importId },
  )
  if (!row) throw notFound('import')
  if (row.state !== 'staged') {
    throw conflictWith('import-settled', 'This file was imported or thrown away already. Nothing was changed.')
  }
  return { features: stored.parse(row.features), featureCount: row.feature_count }
}
