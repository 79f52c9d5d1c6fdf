import { createSessionStore, type SessionStore, type TextStore } from '@/sync/react/sessionStore'

/** The browser's `localStorage`, or a memory where it is forbidden; never throws. */
function textStore(): TextStore {
  const memory = new Map<string, string>()
  const attempt = <Result>(work: () => Result, otherwise: () => Result): Result => {
    try {
      return work()
    } catch {
      return otherwise()
    }
  }
  return {
    get: (key) =>
      attempt(
        () => globalThis.localStorage.getItem(key),
        () => memory.get(key) ?? null,
      ),
    set(key, value) {
      memory.set(key, value)
      attempt(
        () => globalThis.localStorage.setItem(key, value),
        () => undefined,
      )
    },
    remove(key) {
      memory.delete(key)
      attempt(
        () => globalThis.localStorage.removeItem(key),
        () => undefined,
      )
    },
  }
}

function randomHex(bytes: number): string {
  return Array.from(globalThis.crypto.getRandomValues(new Uint8Array(bytes)), (byte) =>
    byte.toString(16).padStart(2, '0'),
  ).join('')
}

/** The session of this device, made once. */
export function openDeviceSession(): SessionStore {
  return createSessionStore({
    store: textStore(),
    newId: () => globalThis.crypto.randomUUID(),
    newRotationId: () => randomHex(16),
    alone: async (work) =>
      globalThis.navigator?.locks ? await globalThis.navigator.locks.request('tallystone-refresh', work) : work(),
  })
}

/** What a steward reads in the list of devices. */
export function deviceName(): string {
  const agent = globalThis.navigator?.userAgent ?? ''
  const system =
    ['Android', 'iPhone', 'iPad', 'Windows', 'Mac', 'Linux'].find((name) => agent.includes(name)) ?? 'device'
  return `${system}, browser`
}
