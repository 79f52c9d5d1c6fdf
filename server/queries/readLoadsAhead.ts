import type { Scope } from '@/server/database'
import { notFound, Refusal } from '@/server/errors'
import { presentLoads } from '@/server/run/presentLoads'
import type { LoadsAhead } from '@/shared/api/publications'
import { readPublications } from './readPublications'
import { readRunResult, readRunSummary } from './readRuns'

export interface Fleet {
  readonly containerM3: number
  readonly payloadT: number
}

/** Loads ahead of one publication, for a contractor it was made to. */
export async function readLoadsAhead(scope: Scope, publicationId: string, fleet: Fleet): Promise<LoadsAhead> {
  const [publication] = await readPublications(scope, { publicationId, recipientId: scope.personId })
  if (!publication) throw notFound('publication')
  if (publication.withdrawnAt !== null) {
    throw new Refusal(
      410,
      'publication-withdrawn',
      `This publication was withdrawn: ${publication.withdrawalReason ?? ''} Do not plan with it.`,
    )
  }
  const run = await readRunSummary(scope, publication.runId)
  const result = await readRunResult(scope, publication.runId)
  if (!result) throw new Error('a published run has a result')
  return {
    publication,
    fleet,
    ...presentLoads(result.yearsAhead, fleet),
    basis: {
      computedCount: result.basis.computedCount,
      frameCount: result.basis.frameCount,
      impliedDemolitionRatePerYear: result.basis.impliedDemolitionRatePerYear,
      engineVersion: run.engineVersion,
      yearOffset: run.scenario.yearOffset,
    },
  }
}
