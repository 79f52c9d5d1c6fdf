import { readDeviceEdition, renewDevice } from '@/shared/api/sync'
import type { SyncStore } from '@/db/syncStore.types'
import type { ApiClient } from './api/createApiClient'
import { ApiError } from './api/ApiError'
import type { HandIn, HandInState } from './handIn.types'
import { pullChanges } from './pullChanges'
import { pushOutbox } from './pushOutbox'
import { retryDelayMs } from './retryDelayMs'
import { uploadPhotos } from './uploadPhotos'
import { needsPerson, whyStopped } from './whyStopped'

export interface HandInParts {
  readonly store: SyncStore
  readonly api: ApiClient
  readonly deviceId: () => string
  readonly renewDeviceId: () => string
  readonly deviceName: string
  /** The session goes on with this token under the new device id. */
  readonly adoptToken: (accessToken: string) => void
  readonly now: () => Date
  readonly random: () => number
  /** Calls back later; resolves to what cancels it. */
  readonly later: (work: () => void, delayMs: number) => () => void
}

export interface RunningHandIn extends HandIn {
  /** No more tries by itself. */
  stop(): void
}

const POLL_MS = 60_000
const RESTING: HandInState = {
  phase: 'resting',
  done: 0,
  total: 0,
  network: 'not-tried',
  stoppedBecause: null,
  lastSyncedAt: null,
  nextTryAt: null,
}

/** Push, pull, photos, then push's echo; one at a time, and tried again by itself as long as anything waits. */
export function createHandIn(parts: HandInParts): RunningHandIn {
  const { store, api, deviceId, now, random, later } = parts
  const listeners = new Set<() => void>()
  let state = RESTING
  let running: Promise<void> | null = null
  let failures = 0
  let isStopped = false
  let cancelTimer = () => {}

  const setState = (next: Partial<HandInState>) => {
    state = { ...state, ...next }
    listeners.forEach((listener) => listener())
  }
  const progressOf = (phase: HandInState['phase']) => (done: number, total: number) => setState({ phase, done, total })
  const enrolAnew = async () => {
    const renewed = parts.renewDeviceId()
    const session = await api.call(renewDevice, { body: { deviceId: renewed, name: parts.deviceName } })
    parts.adoptToken(session.accessToken)
    await store.renumber(renewed)
  }
  const shared = { store, api, deviceId, enrolAnew, now }
  const pull = () => pullChanges({ ...shared, onProgress: progressOf('fetching') })
  const fetchEdition = async () => {
    try {
      await store.keepEdition(await api.call(readDeviceEdition))
    } catch (error) {
      // no edition is issued yet: the sheets need none
      if (!(error instanceof ApiError) || error.status !== 404) throw error
    }
  }
  const work = async () => {
    await pushOutbox({ ...shared, onProgress: progressOf('sending') })
    await pull()
    const { photos } = await store.countWaiting()
    await uploadPhotos({ store, api, onProgress: progressOf('sending-photos') })
    if (photos > 0) await pull()
    await fetchEdition()
  }
  const plan = (delayMs: number) => {
    cancelTimer()
    if (isStopped) return
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
      failures += 1
      const stoppedBecause = whyStopped(error)
      const network = stoppedBecause === 'no-network' ? 'not-reached' : 'reached'
      const phase = needsPerson(stoppedBecause) ? 'resting' : 'waiting-to-retry'
      setState({ phase, network, stoppedBecause })
      plan(needsPerson(stoppedBecause) ? POLL_MS : Math.max(500, retryDelayMs(failures, random())))
    }
  }
  const handIn = (): Promise<void> => {
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
      isStopped = true
      cancelTimer()
    },
  }
}
