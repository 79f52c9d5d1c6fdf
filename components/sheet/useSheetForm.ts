import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import type { StoredSheet } from '@/db/fieldStore.types'
import { sheetGroups, sheetReadyForBag, SHEET_GROUPS, type SheetAnswers, type SheetGroup } from '@/shared/schemas/sheet'
import { useField } from '@/sync/react/FieldProvider'
import { answersFromRegister } from './answersFromRegister'
import type { SectionProps } from './form.types'

const KEEP_AFTER_MS = 300

export interface Keeping {
  readonly kind: 'kept' | 'keeping' | 'failed'
  readonly at: string | null
  readonly reason: string | null
}

/** The form of one sheet: every change is written to the device within a moment, and at once when the page is left. */
export function useSheetForm(buildingId: string, stored: StoredSheet) {
  const { store } = useField()
  const [draft, setDraft] = useState<SheetAnswers>(stored.draft)
  const [keeping, setKeeping] = useState<Keeping>({ kind: 'kept', at: stored.keptAt, reason: null })
  const [isTried, setIsTried] = useState(false)
  const waiting = useRef<{ draft: SheetAnswers; timer: ReturnType<typeof setTimeout> } | null>(null)

  const keepNow = useCallback(async () => {
    const due = waiting.current
    if (!due) return
    clearTimeout(due.timer)
    waiting.current = null
    try {
      const { keptAt } = await store.keepDraft(buildingId, due.draft)
      setKeeping({ kind: 'kept', at: keptAt, reason: null })
    } catch (error) {
      setKeeping({ kind: 'failed', at: null, reason: error instanceof Error ? error.message : String(error) })
    }
  }, [store, buildingId])
  useEffect(() => keepWhenLeft(() => void keepNow()), [keepNow])

  const recorded = useMemo((): SheetAnswers => ({ ...stored.building.answers, ...draft }), [stored, draft])
  const offers = useMemo(() => answersFromRegister(stored.building.building.outline), [stored])
  const answers = useMemo((): SheetAnswers => ({ ...offers, ...recorded }), [offers, recorded])
  const offered = useMemo(
    () => new Set(SHEET_GROUPS.filter((group) => recorded[group] === undefined && offers[group] !== undefined)),
    [offers, recorded],
  )
  const keepSoon = (next: SheetAnswers) => {
    if (waiting.current) clearTimeout(waiting.current.timer)
    waiting.current = { draft: next, timer: setTimeout(() => void keepNow(), KEEP_AFTER_MS) }
    setDraft(next)
    setKeeping({ kind: 'keeping', at: null, reason: null })
  }
  const answer: SectionProps['answer'] = (group, value) => keepSoon({ ...draft, [group]: value })
  const unready = useMemo(() => unreadyGroups(answers), [answers])

  /** Puts it in the bag with what the register offered; resolves with whether it is there. */
  const putInBag = async (): Promise<boolean> => {
    setIsTried(true)
    if (unready.length > 0) return false
    keepSoon({ ...draft, ...Object.fromEntries([...offered].map((group) => [group, answers[group]])) })
    await keepNow()
    await store.putInBag(buildingId)
    return true
  }
  return { answers, offered, answer, unready: isTried ? unready : [], keeping, putInBag }
}

/** Groups that are missing or not right yet. */
function unreadyGroups(answers: SheetAnswers): readonly SheetGroup[] {
  const wrong = SHEET_GROUPS.filter(
    (group) => answers[group] !== undefined && !sheetGroups[group].safeParse(answers[group]).success,
  )
  if (wrong.length > 0) return wrong
  const ready = sheetReadyForBag.safeParse(answers)
  if (ready.success) return []
  const named = ready.error.issues.map(({ path }) => path[0])
  return SHEET_GROUPS.filter((group) => named.includes(group))
}

function keepWhenLeft(keep: () => void): () => void {
  if (typeof document === 'undefined') return keep
  const onHidden = () => {
    if (document.visibilityState === 'hidden') keep()
  }
  window.addEventListener('pagehide', keep)
  document.addEventListener('visibilitychange', onHidden)
  return () => {
    window.removeEventListener('pagehide', keep)
    document.removeEventListener('visibilitychange', onHidden)
    keep()
  }
}
