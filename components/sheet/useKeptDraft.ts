import { useCallback, useEffect, useRef, useState } from 'react'
import type { StoredSheet } from '@/db/fieldStore.types'
import { KEEP_NOW } from '@/db/keepNow'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { useField } from '@/sync/react/FieldProvider'

const KEEP_AFTER_MS = 300

export interface Keeping {
  readonly kind: 'kept' | 'keeping' | 'failed'
  readonly at: string | null
  readonly reason: string | null
}

/** The draft of one sheet: every change is written to the device within a moment, and at once when the page is left. */
export function useKeptDraft(buildingId: string, stored: StoredSheet) {
  const { store } = useField()
  const [draft, setDraft] = useState<SheetAnswers>(stored.draft)
  const [keeping, setKeeping] = useState<Keeping>({ kind: 'kept', at: stored.keptAt, reason: null })
  const waiting = useRef<{ draft: SheetAnswers; timer: ReturnType<typeof setTimeout> } | null>(null)

  // an answer that arrives late, as a position does, is added to what was typed meanwhile
  const typed = useRef<SheetAnswers>(stored.draft)
  const storedDraft = useRef<SheetAnswers>(stored.draft)
  useEffect(() => void (storedDraft.current = stored.draft), [stored])

  const fail = (error: unknown) =>
    setKeeping({ kind: 'failed', at: null, reason: error instanceof Error ? error.message : String(error) })
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
      fail(error)
      return false
    }
  }, [store, buildingId])
  useEffect(() => keepWhenLeft(() => void keepNow()), [keepNow])

  const keepSoon = (next: SheetAnswers) => {
    if (waiting.current) clearTimeout(waiting.current.timer)
    waiting.current = { draft: next, timer: setTimeout(() => void keepNow(), KEEP_AFTER_MS) }
    typed.current = next
    setDraft(next)
    setKeeping({ kind: 'keeping', at: null, reason: null })
  }
  /** Goes back to an earlier draft, at once: what is taken back must not come again out of the stored one. */
  const goBackTo = (before: SheetAnswers) => {
    storedDraft.current = before
    keepSoon(before)
    void keepNow()
  }
  // what a refusal brought back into the stored draft meanwhile is kept as well
  const whole = (): SheetAnswers => ({ ...storedDraft.current, ...typed.current })
  return { draft, keeping, whole, keepSoon, keepNow, goBackTo, fail }
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
