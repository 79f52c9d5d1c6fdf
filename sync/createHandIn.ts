import type { DevicePublicKey } from '@/shared/schemas/bagFile'
import type { SyncStore } from '@/db/syncStore.types'
import type { ApiClient } from './api/createApiClient'
import { enrolKey } from './enrolKey'
import { finishRenewal } from './finishRenewal'
import type { HandIn, HandInState } from './handIn.types'
import { retryAfterMs, retryDelayMs } from './retryDelayMs'
import { isShutOut, surrenderBag, type SendSurrender } from './surrenderBag'
import { syncOnce } from './syncOnce'
import { needsPerson, whyStopped } from './whyStopped'

export interface HandInParts {
  readonly store: SyncStore
  readonly api: ApiClient
  readonly deviceId: () => string
  readonly renewDeviceId: () => string
  readonly deviceName: string
  /** Null where the platform keeps no key for the device. */
  readonly publicKey: DevicePublicKey | null
  /** Hands a sealed bag over without a session. */
  readonly sendSurrender: SendSurrender
  /** The session goes on with this token under the new device id. */
  readonly adoptToken: (accessToken: string) => void
  readonly now: () => Date
  readonly random: () => number
  /** Calls back later; resolves to what cancels it. */
  readonly later: (work: () => void, delayMs: number) => () => void
}

export interface RunningHandIn extends HandIn {
  /** Breaks off, and tries no more. */
  stop(): void
}

const POLL_MS = 60_000
/** A new edition of the factor book is rare. */
const EDITION_MS = 3_600_000
const RESTING: HandInState = {
  phase: 'resting',
  done: 0,
  total: 0,
  network: 'not-tried',
  stoppedBecause: null,
  lastSyncedAt: null,
  nextTryAt: null,
}

/** Push, pull, photos; one at a time, and tried again by itself as long as anything waits. */
export function createHandIn(parts: HandInParts): RunningHandIn {
  const { store, api, deviceId, now, random, later } = parts
  const listeners = new Set<() => void>()
  let state = RESTING
  let running: Promise<void> | null = null
  let failures = 0
  let editionDueMs = 0
  const stopping = new AbortController()
  let cancelTimer = () => {}

  const setState = (next: Partial<HandInState>) => {
    state = { ...state, ...next }
    listeners.forEach((listener) => listener())
  }
  const enrolAnew = async () => {
    // the wish first: whatever breaks off after it is ended by the next run
    await store.beginRenewal()
    parts.renewDeviceId()
    await finishRenewal(parts, stopping.signal)
  }
  const work = async () => {
    await finishRenewal(parts, stopping.signal)
    const isEditionDue = now().getTime() >= editionDueMs
    const onProgress = (phase: HandInState['phase'], done: number, total: number) => setState({ phase, done, total })
    await syncOnce({ store, api, deviceId, enrolAnew, now, isEditionDue, onProgress }, stopping.signal)
    if (isEditionDue) editionDueMs = now().getTime() + EDITION_MS
    await enrolKey(parts, stopping.signal)
    await store.evictPhotos()
  }
  const plan = (delayMs: number) => {
    cancelTimer()
    if (stopping.signal.aborted) return
    cancelTimer = later(() => void handIn(), delayMs)
    setState({ nextTryAt: new Date(now().getTime() + delayMs).toISOString() })
  }
  const run = async () => {
    cancelTimer()
    setState({ stoppedBecause: null, nextTryAt: null, phase: 'sending', done: 0, total: 0 })
    try {
      await work()
      failures = 0
      setState({ phase: 'resting', network: 'reached', lastSyncedAt: now().toISOString() })
      plan(POLL_MS * (0.8 + 0.4 * random()))
    } catch (error) {
      if (stopping.signal.aborted) return
      failures += 1
      const isHandedOver = isShutOut(error) && (await surrenderBag(parts, stopping.signal))
      const stoppedBecause = isHandedOver ? 'surrendered' : whyStopped(error)
      const network = stoppedBecause === 'no-network' ? 'not-reached' : 'reached'
      const phase = needsPerson(stoppedBecause) ? 'resting' : 'waiting-to-retry'
      setState({ phase, network, stoppedBecause })
      const delayMs = needsPerson(stoppedBecause) ? POLL_MS : Math.max(500, retryDelayMs(failures, random()))
      plan(Math.max(delayMs, retryAfterMs(error, random())))
    }
  }
  const handIn = (): Promise<void> => {
    if (stopping.signal.aborted) return Promise.resolve()
    running ??= run().finally(() => {
      running = null
    })
    return running
  }
  return {
    getState: () => state,
    subscribe(listener) {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    handIn,
    stop() {
      // what is on its way may belong to somebody who has signed out
      stopping.abort()
      cancelTimer()
    },
  }
}
