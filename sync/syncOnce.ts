import { readDeviceLooks } from '@/shared/api/nextLook'
import { readDeviceEdition } from '@/shared/api/sync'
import type { SyncStore } from '@/db/syncStore.types'
import { ApiError } from './api/ApiError'
import type { ApiClient } from './api/createApiClient'
import type { HandInState } from './handIn.types'
import { pullChanges } from './pullChanges'
import { pushOutbox } from './pushOutbox'
import { uploadPhotos } from './uploadPhotos'

export interface SyncParts {
  readonly store: SyncStore
  readonly api: ApiClient
  readonly deviceId: () => string
  readonly enrolAnew: () => Promise<void>
  readonly now: () => Date
  readonly isEditionDue: boolean
  readonly onProgress: (phase: HandInState['phase'], done: number, total: number) => void
}

/**
 * Everything once: push, pull, the edition and where to look next, photos; then push and pull again if anything came into the bag or into view
 * meanwhile. An app too old to push still pulls (P12).
 *
 * @throws {ApiError} the server refused
 * @throws {UnreachableError} no answer
 */
export async function syncOnce(parts: SyncParts, signal?: AbortSignal): Promise<void> {
  await pushAndPull(parts, signal)
  const editionFault = parts.isEditionDue ? await fetchEdition(parts, signal) : null
  if (parts.isEditionDue) await fetchNextLooks(parts, signal)
  const { photos } = await parts.store.countWaiting()
  await uploadPhotos({ ...parts, onProgress: progressOf(parts, 'sending-photos') }, signal)
  const { unanswered } = await parts.store.countWaiting()
  if (photos > 0 || unanswered > 0) await pushAndPull(parts, signal)
  if (editionFault) throw editionFault
}

async function pushAndPull(parts: SyncParts, signal?: AbortSignal): Promise<void> {
  let tooOld: ApiError | null = null
  try {
    await pushOutbox({ ...parts, onProgress: progressOf(parts, 'sending') }, signal)
  } catch (error) {
    if (!isOfAnotherVersion(error)) throw error
    tooOld = error
  }
  await pullChanges({ ...parts, onProgress: progressOf(parts, 'fetching') }, signal)
  if (tooOld) throw tooOld
}

function isOfAnotherVersion(error: unknown): error is ApiError {
  return error instanceof ApiError && (error.status === 426 || error.code === 'server-too-old')
}

function progressOf({ onProgress }: SyncParts, phase: HandInState['phase']) {
  return (done: number, total: number) => onProgress(phase, done, total)
}

/** Resolves with the server's fault, which must not keep the photos waiting. */
async function fetchEdition({ store, api }: SyncParts, signal?: AbortSignal): Promise<ApiError | null> {
  try {
    await store.keepEdition(await api.call(readDeviceEdition, {}, signal))
    return null
  } catch (error) {
    if (!(error instanceof ApiError)) throw error
    // no edition is issued yet: the sheets need none
    return error.status === 404 ? null : error
  }
}

/** Where to look next is advice: a server that refuses it holds nothing up, and the list before stays. */
async function fetchNextLooks({ store, api }: SyncParts, signal?: AbortSignal): Promise<void> {
  try {
    await store.keepNextLooks((await api.call(readDeviceLooks, {}, signal)).rounds)
  } catch (error) {
    if (!(error instanceof ApiError)) throw error
  }
}
