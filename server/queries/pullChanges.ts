import type { z } from 'zod'
import { requireOwnDevice } from '@/server/policies/requireOwnDevice'
import { retryOnContention } from '@/server/commands/retryOnContention'
import type { Context } from '@/server/context'
import type { Scope } from '@/server/database'
import { Refusal } from '@/server/errors'
import type { SignedIn } from '@/server/middleware/signedIn'
import type { pullChanges as endpoint } from '@/shared/api/sync'
import { MIN_SYNC_SCHEMA } from '@/shared/sync/upconvertMutation'
import { readChangeKeys, type ChangeKey } from './readChangeKeys'
import { readChanges } from './readChanges'
import { readSyncDigest } from './readSyncDigest'
import { readSyncPlace, type SyncPlace } from './readSyncPlace'
import { beatMark, readCursor, writeCursor, type SyncCursor } from './syncCursor'

type Query = z.output<typeof endpoint.query>
type Answer = z.input<typeof endpoint.response>

/**
 * One page of what changed in a surveyor's beats, of one snapshot (rules L1 to L9): new beats are filled in first, then
 * everything in the order of changes.
 *
 * @throws {Refusal} `other-device`, `device-revoked`, `cursor-not-usable`, `resync-required`, `busy`
 */
export async function pullChanges(
  { config, database, now }: Pick<Context, 'config' | 'database' | 'now'>,
  signedIn: SignedIn,
  query: Query,
): Promise<Answer> {
  requireOwnDevice(signedIn, query.deviceId)
  const cursor = query.cursor === undefined ? undefined : readCursor(query.cursor, signedIn, config.sessionSecret)
  const page = await retryOnContention(() =>
    database.withScope(signedIn, (scope) => readPage(scope, query, cursor), { readOnly: true, repeatableRead: true }),
  )
  const { next, ...shown } = page
  return {
    ...shown,
    cursor: writeCursor(next, signedIn, config.sessionSecret),
    serverTime: now().toISOString(),
    minSchema: MIN_SYNC_SCHEMA,
  }
}

type Page = Omit<Answer, 'cursor' | 'serverTime' | 'minSchema'> & { next: SyncCursor }

async function readPage(scope: Scope, query: Query, given: SyncCursor | undefined): Promise<Page> {
  const place = await readSyncPlace(scope, query.deviceId)
  const cursor = given ?? startOf(place)
  if (Math.max(cursor.changeNo, cursor.startHead) < place.floor) throw resyncRequired()
  const served = place.beatIds.filter((beatId) => cursor.beatMarks.has(beatMark(beatId)))
  const added = place.beatIds.filter((beatId) => !cursor.beatMarks.has(beatMark(beatId)))
  const filling = await fillIn(scope, { cursor, added, place, limit: query.limit })
  const keys = [...filling.keys]
  let { next } = filling
  let more = !filling.isDone
  if (filling.isDone) {
    const room = query.limit - keys.length
    const beatIds = [...served, ...added]
    const range = { beatIds, scopeBeatIds: place.beatIds, after: cursor.changeNo, upTo: place.head }
    const rest = await readChangeKeys(scope, { ...range, limit: room + 1 })
    more = rest.length > room
    keys.push(...rest.slice(0, room))
    next = { ...next, changeNo: more ? (keys.at(-1)?.change ?? cursor.changeNo) : place.head }
  }
  const digest = more ? undefined : await digestOf(scope, { cursor, place, isUnchanged: keys.length === 0 })
  return {
    changes: await readChanges(scope, keys),
    more,
    ackSeq: place.lastSeq,
    scope: { epoch: place.scopeEpoch, beatIds: [...place.beatIds] },
    ...(digest ? { digest } : {}),
    next: { ...next, digest },
  }
}

/** A download from the start: every beat is served from change number 0. */
function startOf({ head, beatIds }: SyncPlace): SyncCursor {
  return {
    changeNo: 0,
    startHead: head,
    beatMarks: new Set(beatIds.map(beatMark)),
    fillingMarks: new Set(),
    filledTo: 0,
    digest: undefined,
  }
}

interface Filling {
  readonly keys: readonly ChangeKey[]
  readonly isDone: boolean
  readonly next: SyncCursor
}

/**
 * Beats that are new to the device are brought up to the cursor, by change number. What changes in them meanwhile gets a
 * number beyond the cursor and comes after.
 */
async function fillIn(
  scope: Scope,
  { cursor, added, place, limit }: { cursor: SyncCursor; added: readonly string[]; place: SyncPlace; limit: number },
): Promise<Filling> {
  const servedMarks = new Set(place.beatIds.map(beatMark))
  const done = { ...cursor, beatMarks: servedMarks, fillingMarks: new Set<string>(), filledTo: 0 }
  if (added.length === 0) return { keys: [], isDone: true, next: done }
  const marks = new Set(added.map(beatMark))
  const isSameFilling =
    marks.size === cursor.fillingMarks.size && [...marks].every((mark) => cursor.fillingMarks.has(mark))
  const after = isSameFilling ? cursor.filledTo : 0
  const range = { beatIds: added, scopeBeatIds: place.beatIds, after, upTo: cursor.changeNo }
  const keys = await readChangeKeys(scope, { ...range, limit })
  if (keys.length < limit) return { keys, isDone: true, next: done }
  const kept = [...cursor.beatMarks].filter((mark) => servedMarks.has(mark))
  const filledTo = keys.at(-1)?.change ?? after
  return { keys, isDone: false, next: { ...cursor, beatMarks: new Set(kept), fillingMarks: marks, filledTo } }
}

/** Where nothing changed since the last page, neither things nor beats, its digest is still right. */
async function digestOf(
  scope: Scope,
  { cursor, place, isUnchanged }: { cursor: SyncCursor; place: SyncPlace; isUnchanged: boolean },
) {
  const isSameScope =
    cursor.beatMarks.size === place.beatIds.length &&
    place.beatIds.every((beatId) => cursor.beatMarks.has(beatMark(beatId)))
  if (isUnchanged && isSameScope && cursor.digest) return cursor.digest
  return readSyncDigest(scope, place.beatIds)
}

const resyncRequired = () =>
  new Refusal(
    410,
    'resync-required',
    'This device was away longer than deletions are remembered. What it holds of its own is safe; pull again from the start.',
  )
