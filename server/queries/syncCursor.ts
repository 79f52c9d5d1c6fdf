import { createHmac, timingSafeEqual } from 'node:crypto'
import { z } from 'zod'
import { Refusal } from '@/server/errors'
import { keyFor } from '@/server/middleware/accessToken'
import type { Actor } from '@/server/database'
import type { SyncDigest } from '@/shared/sync/syncDigest'

const VERSION = 1
const SIGNATURE_BYTES = 16

const content = z.object({
  v: z.literal(VERSION),
  /** Everything up to this change number has been served. */
  c: z.number().int().nonnegative(),
  /** Change number at which the first page of a download was served; tombstones before it do not matter to it. */
  s: z.number().int().nonnegative(),
  /** Beats that have been served up to `c`, by {@link beatMark}. */
  b: z.string(),
  /** New beats that are being filled in, and up to which change number they are; absent when there are none. */
  n: z.string().optional(),
  f: z.number().int().nonnegative().optional(),
  /** Digest of what was served, as long as nothing has changed since. */
  d: z.object({ count: z.number().int(), xor64: z.string() }).optional(),
})

/** How far a device has pulled. */
export interface SyncCursor {
  readonly changeNo: number
  readonly startHead: number
  readonly beatMarks: ReadonlySet<string>
  /** New beats that are being filled in. */
  readonly fillingMarks: ReadonlySet<string>
  readonly filledTo: number
  readonly digest: SyncDigest | undefined
}

/** A short name for a beat in a cursor: 64 of its random bits. */
export function beatMark(beatId: string): string {
  return Buffer.from(beatId.replaceAll('-', '').slice(16), 'hex').toString('base64url')
}
const MARK_LENGTH = 11
/** More do not fit an address; the others are filled in again at each pull. */
const MOST_MARKS = 100

function joinMarks(marks: ReadonlySet<string>): string {
  return [...marks].slice(0, MOST_MARKS).join('')
}

function splitMarks(text: string): ReadonlySet<string> {
  return new Set(text.match(new RegExp(`.{${MARK_LENGTH}}`, 'g')) ?? [])
}

/** Writes a cursor that only this server can have written, for this person only. */
export function writeCursor(cursor: SyncCursor, actor: Actor, sessionSecret: string): string {
  const text = JSON.stringify({
    v: VERSION,
    c: cursor.changeNo,
    s: cursor.startHead,
    b: joinMarks(cursor.beatMarks),
    ...(cursor.fillingMarks.size > 0 ? { n: joinMarks(cursor.fillingMarks), f: cursor.filledTo } : {}),
    d: cursor.digest,
  })
  const payload = Buffer.from(text).toString('base64url')
  return `${payload}.${sign(payload, actor, sessionSecret).toString('base64url')}`
}

/** @throws {Refusal} `cursor-not-usable` when it was made up, cut, or made for another person */
export function readCursor(text: string, actor: Actor, sessionSecret: string): SyncCursor {
  const [payload = '', signature = '', ...rest] = text.split('.')
  const given = Buffer.from(signature, 'base64url')
  const right = sign(payload, actor, sessionSecret)
  if (rest.length > 0 || given.length !== right.length || !timingSafeEqual(given, right)) throw notUsable()
  const parsed = content.safeParse(parseJson(Buffer.from(payload, 'base64url').toString()))
  if (!parsed.success) throw notUsable()
  const { c, s, b, n, f, d } = parsed.data
  return {
    changeNo: c,
    startHead: s,
    beatMarks: splitMarks(b),
    fillingMarks: splitMarks(n ?? ''),
    filledTo: f ?? 0,
    digest: d,
  }
}

function sign(payload: string, { organisationId, personId }: Actor, sessionSecret: string): Buffer {
  return createHmac('sha256', keyFor('sync-cursor', sessionSecret))
    .update(`${organisationId}:${personId}:${payload}`)
    .digest()
    .subarray(0, SIGNATURE_BYTES)
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}

const notUsable = () =>
  new Refusal(
    400,
    'cursor-not-usable',
    'The place to go on from is not one this server gave to you. Nothing was changed; pull again from the start.',
  )
