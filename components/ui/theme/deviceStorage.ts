/** Where a choice of this device is kept: two of the methods of `localStorage`. */
export interface ChoiceStorage {
  getItem(key: string): string | null
  setItem(key: string, value: string): void
}

/**
 * The browser's `localStorage`, or a memory that lasts as long as the app where there is none or it is forbidden.
 * Never throws: a look that cannot be kept is no reason to stop.
 */
export function deviceStorage(): ChoiceStorage {
  const memory = new Map<string, string>()
  return {
    getItem(key) {
      try {
        return globalThis.localStorage?.getItem(key) ?? memory.get(key) ?? null
      } catch {
        return memory.get(key) ?? null
      }
    },
    setItem(key, value) {
      memory.set(key, value)
      try {
        globalThis.localStorage?.setItem(key, value)
      } catch {
        // The memory above already holds the choice for this visit.
      }
    },
  }
}
