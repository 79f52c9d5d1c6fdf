import { useEffect, useState, useSyncExternalStore } from 'react'
import { deviceStorage } from '@/components/ui/theme/deviceStorage'
import { msUntilAsked, parseWalk, type Walk } from './walk'

const KEY = 'tallystone.walk'
const LAST_KEY = 'tallystone.walkCall'
const storage = deviceStorage()
const listeners = new Set<() => void>()
let current: Walk | null = parseWalk(storage.getItem(KEY))

function set(walk: Walk | null): void {
  current = walk
  storage.setItem(KEY, walk ? JSON.stringify(walk) : '')
  if (walk) storage.setItem(LAST_KEY, JSON.stringify(walk))
  for (const listener of listeners) listener()
}

/** The walk under way on this device. It stays here: nothing of it is tracked or sent. */
export function useWalk() {
  const walk = useSyncExternalStore(
    (listener) => {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    () => current,
    () => null,
  )
  return {
    walk,
    /** Whom the last walk named, to start the next with. */
    last: () => parseWalk(storage.getItem(LAST_KEY)),
    start: (plan: Pick<Walk, 'askEveryMinutes' | 'callName' | 'callNumber'>, nowMs: number) =>
      set({ ...plan, startedAtMs: nowMs, lastWellAtMs: nowMs }),
    allWell: (nowMs: number) => (current ? set({ ...current, lastWellAtMs: nowMs }) : undefined),
    end: () => set(null),
  }
}

/** Whether the question is due, looked at twice a minute and when the page comes into sight again. */
export function useIsAsked(walk: Walk | null): boolean {
  const [nowMs, setNowMs] = useState(() => new Date().getTime())
  useEffect(() => {
    if (walk?.askEveryMinutes == null) return
    const look = () => setNowMs(new Date().getTime())
    look()
    const timer = setInterval(look, 30_000)
    globalThis.document?.addEventListener('visibilitychange', look)
    return () => {
      clearInterval(timer)
      globalThis.document?.removeEventListener('visibilitychange', look)
    }
  }, [walk])
  const leftMs = walk ? msUntilAsked(walk, nowMs) : null
  return leftMs !== null && leftMs <= 0
}
