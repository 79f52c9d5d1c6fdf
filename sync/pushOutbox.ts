import { pushMutations } from '@/shared/api/sync'
import type { Problem } from '@/shared/schemas/problem'
import { PUSH_LIMIT, SYNC_SCHEMA } from '@/shared/schemas/sync'
import type { SyncStore, WaitingMutation } from '@/db/syncStore.types'
import { ApiError } from './api/ApiError'
import type { ApiClient } from './api/createApiClient'

const MOST_BYTES = 900_000
const MOST_ENROLMENTS = 3

export interface PushParts {
  readonly store: SyncStore
  readonly api: ApiClient
  readonly deviceId: () => string
  /** Takes another device id on both sides and numbers the bag afresh (P4). */
  readonly enrolAnew: () => Promise<void>
  readonly onProgress: (done: number, total: number) => void
}

/**
 * Sends what waits in the bag, oldest first, until nothing waits. Safe to break off anywhere: the server knows a repeated
 * mutation by its id, and an entry leaves the bag only after pull (P2, L4).
 *
 * @throws {ApiError} the server refused a batch as a whole; nothing of it was judged
 * @throws {UnreachableError} no answer
 */
export async function pushOutbox(parts: PushParts, signal?: AbortSignal): Promise<void> {
  const { store, onProgress } = parts
  const { unanswered: total } = await store.countWaiting()
  let done = 0
  let mostCount = PUSH_LIMIT
  let enrolments = 0
  const enrolAnew = async () => {
    // a server that knows no number of any id must not be asked for ever
    if ((enrolments += 1) > MOST_ENROLMENTS) throw new Error('the numbers of the bag are refused under every device id')
    await parts.enrolAnew()
  }
  for (;;) {
    const batch = await store.nextBatch(mostCount, MOST_BYTES)
    if (batch.length === 0) return
    onProgress(done, Math.max(total, done + batch.length))
    try {
      await pushBatch(parts, batch, signal)
      done += batch.length
    } catch (error) {
      mostCount = await afterRefusal({ ...parts, enrolAnew }, batch, error)
    }
  }
}

async function pushBatch({ store, api, deviceId }: PushParts, batch: readonly WaitingMutation[], signal?: AbortSignal) {
  const body = { deviceId: deviceId(), schema: SYNC_SCHEMA, batch: batch.map(({ mutation }) => mutation) }
  const { results } = await api.call(pushMutations, { body }, signal)
  const answered = new Set(results.map(({ id }) => id))
  const silent = batch.filter(({ mutationId }) => !answered.has(mutationId))
  await store.settle(results)
  if (silent.length > 0) throw new Error(`no outcome for ${silent.length} of ${batch.length} mutations`)
}

/** What to do about a batch that was refused as a whole; resolves with the size of the next one. */
async function afterRefusal(parts: PushParts, batch: readonly WaitingMutation[], error: unknown): Promise<number> {
  if (!(error instanceof ApiError)) throw error
  const { problem } = error
  if (problem.code === 'sequence-fork' || problem.code === 'sequence-gap') {
    if (!(await canGoOnFrom(parts.store, problem, batch[0]?.seq))) await parts.enrolAnew()
    return PUSH_LIMIT
  }
  if (!TOO_MUCH.includes(problem.status)) throw error
  const [only] = batch
  if (batch.length > 1 || !only) return Math.max(1, Math.floor(batch.length / 2))
  await parts.store.setApart(only.mutationId, problem)
  return PUSH_LIMIT
}

/** The whole batch was refused for its size or for one of its entries: halve it until the one is found. */
const TOO_MUCH: readonly number[] = [400, 413, 422]

/** Whether the number the server waits for is in the bag, and is another one than was just sent. */
async function canGoOnFrom(store: SyncStore, { code, expected }: Problem, sent: number | undefined): Promise<boolean> {
  if (code !== 'sequence-gap' || expected === undefined || expected === sent) return false
  return store.hasSeq(expected)
}
