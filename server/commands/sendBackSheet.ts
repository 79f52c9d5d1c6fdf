import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { conflictWith } from '@/server/errors'
import { readReviewSheet } from '@/server/queries/readReviewSheet'
import type { ReviewSheet } from '@/shared/api/review'
import { retryOnContention } from './retryOnContention'
import { reviewSheets } from './reviewSheets'

/**
 * Returns a sheet to its surveyor with a question.
 *
 * @throws {Refusal} `not-found`, `changed-meanwhile` when it is no longer as it was seen
 */
export async function sendBackSheet(
  { database, now }: Pick<Context, 'database' | 'now'>,
  actor: Actor,
  { sheetId, change, question }: { sheetId: string; change: number; question: string },
): Promise<ReviewSheet> {
  return retryOnContention(() =>
    database.withScope(actor, async (scope) => {
      const done = await reviewSheets(scope, [{ sheetId, change }], { state: 'sent-back', question, now: now() })
      const sheet = await readReviewSheet(scope, sheetId)
      if (done.length === 0) throw changedMeanwhile()
      return sheet
    }),
  )
}

const changedMeanwhile = () =>
  conflictWith(
    'changed-meanwhile',
    'Somebody wrote on this sheet while you looked at it. Nothing was changed; look at it again, then decide.',
  )
