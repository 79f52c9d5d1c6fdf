import type { SheetAnswers } from '@/shared/schemas/sheet'
import { canonicalJson } from '@/shared/sync/canonicalJson'

/** What the server confirmed, then what the bag says in its order, then the draft; group by group. */
export function standingAnswers(
  confirmed: SheetAnswers,
  inTheBag: readonly SheetAnswers[],
  draft: SheetAnswers = {},
): SheetAnswers {
  return Object.assign({}, confirmed, ...inTheBag, draft) as SheetAnswers
}

/** The groups of a draft that say something else than what stands. */
export function changedGroups(standing: SheetAnswers, draft: SheetAnswers): SheetAnswers {
  const before = new Map(Object.entries(standing))
  const changed = Object.entries(draft).filter(
    ([group, value]) => value !== undefined && canonicalJson(before.get(group)) !== canonicalJson(value),
  )
  return Object.fromEntries(changed) as SheetAnswers
}
