import { createHash } from 'node:crypto'
import { z } from 'zod'
import { conflictWith, Refusal, unusable } from '@/server/errors'
import type { Fault } from '@/shared/schemas/problem'
import { id } from '@/shared/schemas/primitives'
import { SYNC_SCHEMA } from '@/shared/schemas/sync'
import { judgeMutation, type Judgement } from '@/shared/sync/judgeMutation'
import { MIN_SYNC_SCHEMA, upconvertMutation } from '@/shared/sync/upconvertMutation'

const envelope = z.object({ id, seq: z.number().int().positive() })

/** A mutation as it came, judged for itself. */
export interface ReceivedMutation {
  readonly id: string
  readonly seq: number
  readonly payload: object
  /** SHA-256 of its fingerprint, hexadecimal. */
  readonly sha256: string
  readonly judgement: Judgement
}

/**
 * Reads a batch before any transaction is opened: ids and numbers of all, and each mutation judged for itself.
 *
 * @throws {Refusal} `upgrade-required`, `server-too-old`; `input-not-usable` naming what has no id or number, or is out of order
 */
export function readBatch(batch: readonly unknown[], schema: number): ReceivedMutation[] {
  requireKnownSchema(schema)
  const faults: Fault[] = []
  const received: ReceivedMutation[] = []
  batch.forEach((payload, position) => {
    const parsed = envelope.safeParse(payload)
    const last = received.at(-1)?.seq ?? 0
    if (!parsed.success || typeof payload !== 'object' || payload === null) {
      faults.push(fault(position, 'not-readable', 'has no id and sequence number that can be read'))
    } else if (parsed.data.seq <= last) {
      faults.push(fault(position, 'out-of-order', 'sequence numbers must rise within a batch'))
    } else {
      received.push(judge(parsed.data, payload, schema))
    }
  })
  if (faults.length === 0) return received
  throw unusable('This batch cannot be read. Nothing of it was taken; everything is safe on the device.', faults)
}

function judge({ id: mutationId, seq }: z.infer<typeof envelope>, payload: object, schema: number): ReceivedMutation {
  const asSent = judgeMutation(payload)
  const judgement = schema === SYNC_SCHEMA ? asSent : judgeMutation(upconvertMutation(payload, schema))
  // What may not even be written out is known again by its id alone.
  const sha256 = createHash('sha256')
    .update(asSent.fingerprint ?? `unreadable:${mutationId}`)
    .digest('hex')
  return { id: mutationId, seq, payload, sha256, judgement }
}

/** @throws {Refusal} `upgrade-required`, `server-too-old` */
function requireKnownSchema(schema: number): void {
  if (schema < MIN_SYNC_SCHEMA) {
    throw new Refusal(
      426,
      'upgrade-required',
      'This app is too old to hand in. Everything is safe on the device; update the app, then hand in.',
    )
  }
  if (schema > SYNC_SCHEMA) {
    throw conflictWith(
      'server-too-old',
      'This app is newer than the server. Everything is safe on the device; hand in again when the server is updated.',
    )
  }
}

function fault(position: number, code: string, detail: string): Fault {
  return { pointer: `/body/batch/${position}`, code, detail }
}
