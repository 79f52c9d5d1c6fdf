import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { retryOnContention } from './retryOnContention'
import { reviewSheets, type SheetAsSeen } from './reviewSheets'

/** Accepts sheets as they were seen; one that changed meanwhile, or is not there, is left and named. */
export async function checkSheets(
  { database, now }: Pick<Context, 'database' | 'now'>,
  actor: Actor,
  sheets: readonly SheetAsSeen[],
): Promise<{ checkedIds: string[]; changedMeanwhileIds: string[] }> {
  const checkedIds = await retryOnContention(() =>
    database.withScope(actor, (scope) => reviewSheets(scope, sheets, { state: 'checked', question: null, now: now() })),
  )
  const checked = new Set(checkedIds)
  const left = sheets.flatMap(({ sheetId }) => (checked.has(sheetId) ? [] : [sheetId]))
  return { checkedIds, changedMeanwhileIds: [...new Set(left)] }
}
