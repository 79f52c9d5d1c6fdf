import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import type { StoredSheet } from '@/db/fieldStore.types'
import { KEEP_NOW } from '@/db/keepNow'
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

  // an answer that arrives late, as a position does, is added to what was typed meanwhile
  const typed = useRef<SheetAnswers>(stored.draft)
  const storedDraft = useRef<SheetAnswers>(stored.draft)
  useEffect(() => void (storedDraft.current = stored.draft), [stored])

  const keepNow = useCallback(async (): Promise<boolean> => {
    const due = waiting.current
    if (!due) return true
    clearTimeout(due.timer)
    waiting.current = null
    try {
      const { keptAt } = await store.keepDraft(buildingId, due.draft)
      setKeeping({ kind: 'kept', at: keptAt, reason: null })
      return true
    } catch (error) {
      setKeeping(failedBy(error))
      return false
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
    typed.current = next
    setDraft(next)
    setKeeping({ kind: 'keeping', at: null, reason: null })
  }
  // what a refusal brought back into the stored draft meanwhile is kept as well
  const whole = (): SheetAnswers => ({ ...storedDraft.current, ...typed.current })
  const answer: SectionProps['answer'] = (group, value) => keepSoon({ ...whole(), [group]: value })
  const unready = useMemo(() => unreadyGroups(answers), [answers])

  /** Puts it in the bag with what the register offered. */
  const putInBag = async (): Promise<'done' | 'not-ready' | 'nothing-changed' | 'not-kept'> => {
    setIsTried(true)
    if (unready.length > 0) return 'not-ready'
    const taken = Object.fromEntries(offersTaken(answers, offered).map((group) => [group, answers[group]]))
    if (Object.keys({ ...whole(), ...taken }).length === 0) return 'nothing-changed'
    keepSoon({ ...whole(), ...taken })
    // what is not on the disk must not be left behind by a bag that is
    if (!(await keepNow())) return 'not-kept'
    try {
      await store.putInBag(buildingId)
    } catch (error) {
      setKeeping(failedBy(error))
      return 'not-kept'
    }
    void globalThis.navigator?.storage?.persist?.().catch(() => undefined)
    return 'done'
  }
  return { answers, offered, answer, unready: isTried ? unready : [], keeping, putInBag }
}

function failedBy(error: unknown): Keeping {
  return { kind: 'failed', at: null, reason: error instanceof Error ? error.message : String(error) }
}

/** What the register offers of a building counts only where one stands. */
function offersTaken(answers: SheetAnswers, offered: ReadonlySet<SheetGroup>): readonly SheetGroup[] {
  const stands = answers.finding?.kind === 'standing'
  return [...offered].filter((group) => stands || group === 'finding')
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
  window.addEventListener(KEEP_NOW, keep)
  document.addEventListener('visibilitychange', onHidden)
  return () => {
    window.removeEventListener('pagehide', keep)
    window.removeEventListener(KEEP_NOW, keep)
    document.removeEventListener('visibilitychange', onHidden)
    keep()
  }
}
