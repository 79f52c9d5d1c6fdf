import { pullChanges as pullEndpoint } from '@/shared/api/sync'
import { PULL_LIMIT, SYNC_SCHEMA } from '@/shared/schemas/sync'
import type { SyncStore } from '@/db/syncStore.types'
import { ApiError } from './api/ApiError'
import type { ApiClient } from './api/createApiClient'

export interface PullParts {
  readonly store: SyncStore
  readonly api: ApiClient
  readonly deviceId: () => string
  readonly enrolAnew: () => Promise<void>
  readonly onProgress: (done: number, total: number) => void
  readonly now: () => Date
}

/**
 * Fetches what changed, page by page, and then drops from the bag what the server's snapshot holds (L2, L4).
 * Breaking off between pages loses nothing: each page is stored with its cursor.
 *
 * @throws {ApiError} the server refused
 * @throws {UnreachableError} no answer
 * @throws {Error} the rows differ from the server's even after they were fetched anew
 */
export async function pullChanges(parts: PullParts, signal?: AbortSignal): Promise<void> {
  if (await pullOnce(parts, signal)) return
  await parts.store.startRebuild()
  if (!(await pullOnce(parts, signal))) throw new Error('the rows differ from the server after a rebuild')
}

/** Resolves with whether the rows agree with the server's digest (L6). */
async function pullOnce(parts: PullParts, signal?: AbortSignal): Promise<boolean> {
  const { store, onProgress } = parts
  let fetched = 0
  for (;;) {
    const page = await readPage(parts, signal)
    const { changes, cursor, more, scope } = page
    await store.applyPage({ changes, cursor, beatIds: scope.beatIds, isLast: !more })
    fetched += changes.length
    onProgress(fetched, fetched)
    if (more) continue
    if (page.ackSeq >= (await store.nextSeq())) {
      await parts.enrolAnew()
      return true
    }
    await store.dropConfirmed(page.ackSeq, parts.now().toISOString())
    if (!page.digest) return true
    const held = await store.baseDigest()
    return held.count === page.digest.count && held.xor64 === page.digest.xor64
  }
}

async function readPage({ store, api, deviceId }: PullParts, signal?: AbortSignal) {
  const ask = async () => {
    const cursor = await store.readCursor()
    const query = { deviceId: deviceId(), schema: SYNC_SCHEMA, limit: PULL_LIMIT, ...(cursor ? { cursor } : {}) }
    return api.call(pullEndpoint, { query }, signal)
  }
  try {
    return await ask()
  } catch (error) {
    const isStale = error instanceof ApiError && ['resync-required', 'cursor-not-usable'].includes(error.code)
    if (!isStale) throw error
    await store.startRebuild()
    return ask()
  }
}
