/** A clock that stands until it is told to go on. */
export interface FakeClock {
  readonly now: () => Date
  advanceMs(ms: number): void
  set(at: string): void
}

/**
 * @param start ISO 8601; without it the clock stands at the moment of the call, so that tokens agree with
 *   `now()` in the database
 */
export function fakeClock(start?: string): FakeClock {
  let currentMs = start === undefined ? new Date().getTime() : new Date(start).getTime()
  return {
    now: () => new Date(currentMs),
    advanceMs(ms) {
      currentMs += ms
    },
    set(at) {
      currentMs = new Date(at).getTime()
    },
  }
}
