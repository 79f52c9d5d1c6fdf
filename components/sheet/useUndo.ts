import { useCallback, useRef, useState } from 'react'
import type { SheetAnswers, SheetGroup } from '@/shared/schemas/sheet'

const MOST_STEPS = 50
/** Typing in one field is one step. */
const SAME_STEP_MS = 1_500

interface Step {
  readonly draft: SheetAnswers
  readonly group: SheetGroup | null
  readonly atMs: number
}

/** Drafts before each change of a form, the newest last. */
export function useUndo() {
  const steps = useRef<Step[]>([])
  const [count, setCount] = useState(0)
  const remember = useCallback((before: SheetAnswers, group: SheetGroup | null) => {
    const atMs = performance.now()
    const last = steps.current.at(-1)
    if (last && group !== null && last.group === group && atMs - last.atMs < SAME_STEP_MS) {
      steps.current[steps.current.length - 1] = { ...last, atMs }
      return
    }
    steps.current = [...steps.current, { draft: before, group, atMs }].slice(-MOST_STEPS)
    setCount(steps.current.length)
  }, [])
  const takeBack = useCallback((): SheetAnswers | null => {
    const last = steps.current.pop()
    setCount(steps.current.length)
    return last?.draft ?? null
  }, [])
  return { remember, takeBack, canUndo: count > 0 }
}
