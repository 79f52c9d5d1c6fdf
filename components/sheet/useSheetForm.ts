import { useMemo, useState } from 'react'
import type { StoredSheet } from '@/db/fieldStore.types'
import { sheetGroups, sheetReadyForBag, SHEET_GROUPS, type SheetAnswers, type SheetGroup } from '@/shared/schemas/sheet'
import { useField } from '@/sync/react/FieldProvider'
import { answersFromRegister } from './answersFromRegister'
import type { SectionProps } from './form.types'
import { noteLastRecorded } from './lastRecorded'
import { confirmedAnswers, unconfirmedAnswers, withoutMark } from './unconfirmedAnswers'
import { useKeptDraft } from './useKeptDraft'
import { useUndo } from './useUndo'

/** The form of one sheet: answers as they stand, what is not confirmed of them, and the way back and into the bag. */
export function useSheetForm(buildingId: string, stored: StoredSheet) {
  const { store } = useField()
  const { draft, keeping, whole, keepSoon, keepNow, goBackTo, fail } = useKeptDraft(buildingId, stored)
  const [isTried, setIsTried] = useState(false)
  const { remember, takeBack, canUndo } = useUndo()

  const recorded = useMemo((): SheetAnswers => ({ ...stored.building.answers, ...draft }), [stored, draft])
  const offers = useMemo(() => answersFromRegister(stored.building.building.outline), [stored])
  const answers = useMemo((): SheetAnswers => ({ ...offers, ...recorded }), [offers, recorded])
  const unconfirmed = useMemo(() => unconfirmedAnswers(answers), [answers])
  const unready = useMemo(() => unreadyGroups(answers), [answers])

  const change = (next: SheetAnswers, group: SheetGroup | null) => {
    remember(whole(), group)
    keepSoon({ ...whole(), ...next })
  }
  const answer: SectionProps['answer'] = (group, value) => change({ [group]: withoutMark(value) }, group)
  const confirm: SectionProps['confirm'] = (groups) => change(confirmedAnswers(answers, groups), null)
  const offer = (suggested: SheetAnswers) => change(suggested, null)
  const undo = () => {
    const before = takeBack()
    if (before) goBackTo(before)
  }

  /** Puts it in the bag with what the register offered, marked as not confirmed. */
  const putInBag = async (): Promise<'done' | 'not-ready' | 'nothing-changed' | 'not-kept'> => {
    setIsTried(true)
    if (unready.length > 0) return 'not-ready'
    const next = { ...whole(), ...offersTaken(answers, recorded) }
    if (Object.keys(next).length === 0) return 'nothing-changed'
    keepSoon(next)
    // what is not on the disk must not be left behind by a bag that is
    if (!(await keepNow())) return 'not-kept'
    try {
      await store.putInBag(buildingId)
    } catch (error) {
      fail(error)
      return 'not-kept'
    }
    noteLastRecorded(buildingId)
    void globalThis.navigator?.storage?.persist?.().catch(() => undefined)
    return 'done'
  }
  const shown = { answers, unconfirmed, unready: isTried ? unready : [], keeping, canUndo }
  return { ...shown, answer, confirm, offer, undo, putInBag }
}

/** What the register offers goes along with its mark, and only where a building stands. */
function offersTaken(answers: SheetAnswers, recorded: SheetAnswers): SheetAnswers {
  if (answers.finding?.kind !== 'standing') return {}
  const taken = SHEET_GROUPS.filter((group) => recorded[group] === undefined && answers[group] !== undefined)
  return Object.fromEntries(taken.map((group) => [group, answers[group]])) as SheetAnswers
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
