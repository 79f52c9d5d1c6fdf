/** A walk under way: when it began, when the person last said that all is well, and whom to call. */
export interface Walk {
  readonly startedAtMs: number
  readonly lastWellAtMs: number
  /** Null: no question is asked. */
  readonly askEveryMinutes: number | null
  /** Whom to call, as typed: a name and a number. */
  readonly callName: string
  readonly callNumber: string
}

export const ASK_EVERY_MINUTES = [15, 30, 60] as const

const MINUTE_MS = 60_000

/**
 * Milliseconds until "All well?" is asked; zero or less once it is due; null when nothing is asked.
 *
 * @example
 * msUntilAsked({ startedAtMs: 0, lastWellAtMs: 0, askEveryMinutes: 30, callName: '', callNumber: '' }, 600_000) // => 1_200_000
 */
export function msUntilAsked({ askEveryMinutes, lastWellAtMs }: Walk, nowMs: number): number | null {
  return askEveryMinutes === null ? null : lastWellAtMs + askEveryMinutes * MINUTE_MS - nowMs
}

/** A number a phone can dial: digits and a leading plus; null when there is none. */
export function dialable(typed: string): string | null {
  const digits = typed.replace(/[^\d+]/g, '').replace(/(?!^)\+/g, '')
  return /\d{3}/.test(digits) ? digits : null
}

/** Reads a walk that was kept; null when there is none or it cannot be read. */
export function parseWalk(text: string | null): Walk | null {
  if (!text) return null
  try {
    const kept: unknown = JSON.parse(text)
    return isWalk(kept) ? kept : null
  } catch {
    return null
  }
}

function isWalk(kept: unknown): kept is Walk {
  if (typeof kept !== 'object' || kept === null) return false
  const walk = kept as Partial<Record<keyof Walk, unknown>>
  const isAsked = walk.askEveryMinutes === null || typeof walk.askEveryMinutes === 'number'
  const areTimes = typeof walk.startedAtMs === 'number' && typeof walk.lastWellAtMs === 'number'
  return isAsked && areTimes && typeof walk.callName === 'string' && typeof walk.callNumber === 'string'
}
