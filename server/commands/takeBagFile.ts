import { createHash, createPublicKey, verify } from 'node:crypto'
import type { Scope } from '@/server/database'
import { Refusal, toProblem, unusable } from '@/server/errors'
import { stableId } from '@/server/stableId'
import { bagFileMessage, devicePublicKey, savedDraft, type BagFile } from '@/shared/schemas/bagFile'
import { id } from '@/shared/schemas/primitives'
import type { Problem } from '@/shared/schemas/problem'
import { canonicalJson } from '@/shared/sync/canonicalJson'
import { inspectPayload } from '@/shared/sync/inspectPayload'

interface Taken {
  readonly takenCount: number
  readonly knownCount: number
  readonly sha256: string
}

/**
 * Puts every entry of a saved bag in quarantine, in the name of the person of its device; nothing of it counts until a
 * steward releases it. Entries that were judged or set apart before are only counted, so a file may come twice, and
 * before or after its phone hands in as usual.
 */
export async function takeBagFile(
  scope: Scope,
  { bag, sha256 }: BagFile,
  { source, now }: { source: 'surrendered' | 'imported'; now: Date },
): Promise<Taken> {
  const reason = REASONS[source]
  const entries = [
    ...bag.mutations.map((payload) => entryOf(payload, bag.deviceId, reason.mutation)),
    ...bag.refused.map((refused) => entryOf(mutationOf(refused), bag.deviceId, reason.mutation)),
    ...bag.drafts.flatMap((draft) => draftEntry(draft, bag.deviceId, reason.draft)),
  ]
  const unique = [...new Map(entries.map((entry) => [entry.mutationId, entry])).values()]
  const rows = await scope.select<{ mutation_id: string }>(
    `INSERT INTO quarantine (organisation_id, mutation_id, device_id, person_id, reason, payload, received_at, source)
     SELECT $organisationId, r."mutationId", $deviceId, $personId, r.reason, r.payload, $now, $source
     FROM json_to_recordset($entries::json) AS r("mutationId" uuid, reason jsonb, payload jsonb)
     WHERE NOT EXISTS (SELECT FROM applied_mutation a
       WHERE a.organisation_id = $organisationId AND a.mutation_id = r."mutationId")
     ON CONFLICT (organisation_id, mutation_id) DO NOTHING RETURNING mutation_id`,
    {
      organisationId: scope.organisationId,
      personId: bag.personId,
      deviceId: bag.deviceId,
      source,
      now,
      entries: JSON.stringify(unique),
    },
  )
  return { takenCount: rows.length, knownCount: unique.length - rows.length, sha256 }
}

/**
 * Whether the digest of a file is that of its content.
 *
 * @throws {Refusal} `input-not-usable` when the file was changed or cut after it was saved, or nests too deeply
 */
export function requireWholeFile({ bag, sha256 }: BagFile): void {
  const fault = inspectPayload(bag)
  const isWhole = fault !== 'too-deep' && sha256Of(canonicalJson(bag)) === sha256
  if (isWhole) return
  throw unusable(
    'This file is not as a phone saved it: it was cut or changed. Nothing was read in; take another copy.',
    [{ pointer: '/body/sha256', code: 'digest-wrong', detail: 'the SHA-256 of the bag differs' }],
  )
}

/** Whether the file was signed by the key that its device enrolled; false also for a device without a key. */
export async function isSignedByDevice(scope: Scope, { bag, sha256, signature }: BagFile): Promise<boolean> {
  if (signature === undefined) return false
  const [row] = await scope.select<{ public_key: unknown }>(
    'SELECT public_key FROM device_key WHERE organisation_id = $organisationId AND device_id = $deviceId',
    { organisationId: scope.organisationId, deviceId: bag.deviceId },
  )
  const jwk = devicePublicKey.safeParse(row?.public_key)
  if (!jwk.success) return false
  const key = createPublicKey({ key: jwk.data, format: 'jwk' })
  const message = Buffer.from(bagFileMessage(bag.deviceId, sha256))
  return verify('sha256', message, { key, dsaEncoding: 'ieee-p1363' }, Buffer.from(signature, 'base64url'))
}

interface Entry {
  readonly mutationId: string
  readonly reason: Problem
  readonly payload: unknown
}

/** What has no id that can be read goes under one made of its content, the same each time the file comes. */
function entryOf(payload: unknown, deviceId: string, reason: Problem): Entry {
  const given = id.safeParse(typeof payload === 'object' && payload !== null ? Reflect.get(payload, 'id') : undefined)
  const text = canonicalJson(payload)
  const kept = typeof payload === 'object' && payload !== null && inspectPayload(payload) === null ? payload : { text }
  return { mutationId: given.success ? given.data : stableId('bag-entry', deviceId, text), reason, payload: kept }
}

function mutationOf(refused: unknown): unknown {
  return typeof refused === 'object' && refused !== null ? Reflect.get(refused, 'mutation') : refused
}

/** A begun sheet becomes an entry like any other; its person had not put it in the bag, which its reason says. */
function draftEntry(draft: unknown, deviceId: string, reason: Problem): Entry[] {
  const parsed = savedDraft.safeParse(draft)
  if (!parsed.success) return [entryOf(draft, deviceId, reason)]
  const { buildingId, answers, seen, keptAt } = parsed.data
  const mutationId = stableId('begun-sheet', deviceId, canonicalJson(parsed.data))
  const core = { id: mutationId, seq: 1, op: 'set', type: 'sheet', entity: buildingId, seen, set: answers }
  return [entryOf({ ...core, at: keptAt, elapsedMs: 0 }, deviceId, reason)]
}

const waits = (code: string, detail: string) => toProblem(new Refusal(403, code, detail))
const REASONS = {
  surrendered: {
    mutation: waits('surrendered', 'A device that is shut out handed this over. It waits for a steward.'),
    draft: waits(
      'surrendered-begun',
      'A device that is shut out handed over this sheet, begun and not put in the bag.',
    ),
  },
  imported: {
    mutation: waits('imported', 'This was read in from a saved copy. It waits for a steward.'),
    draft: waits('imported-begun', 'This sheet was begun and not put in the bag when the copy was saved.'),
  },
} as const

function sha256Of(text: string): string {
  return createHash('sha256').update(text).digest('hex')
}
