import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import { presentLoadParts } from '@/server/presenters/presentLoadParts'
import type { LoadReceipt } from '@/shared/api/receipts'
import { readFullEdition } from './readEditions'
import { readLoadsAhead, type Fleet } from './readLoadsAhead'
import { readRunResult, readRunSummary } from './readRuns'

/**
 * A line of a publication down to what was published: materials and flows of the district as a whole, no building.
 *
 * @throws {Refusal} `not-found` unless it was published to the person who asks, `publication-withdrawn`
 */
export async function readLoadReceipt(
  scope: Scope,
  publicationId: string,
  { code, year, ...fleet }: Fleet & { readonly code: string; readonly year: number },
): Promise<LoadReceipt> {
  const loads = await readLoadsAhead(scope, publicationId, fleet)
  const line = loads.lines.find((one) => one.code === code && one.year === year)
  if (!line) throw notFound('line of this publication')
  const { runId } = loads.publication
  const result = await readRunResult(scope, runId)
  if (!result) throw new Error('a published run has a result')
  const edition = await readFullEdition(scope, (await readRunSummary(scope, runId)).editionId)
  return { publication: loads.publication, fleet, line, ...presentLoadParts(line, result, edition) }
}
