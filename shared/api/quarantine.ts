import { z } from 'zod'
import { bagFile } from '@/shared/schemas/bagFile'
import { id, moment, typedText } from '@/shared/schemas/primitives'
import { problem } from '@/shared/schemas/problem'
import { defineEndpoint, nothing } from './defineEndpoint'

export const QUARANTINE_STATES = ['waiting', 'released', 'discarded'] as const
export const QUARANTINE_SOURCES = ['refused', 'surrendered', 'imported'] as const

/** Work that was set apart: what a person recorded, and why it does not count yet. */
export const quarantineEntry = z.object({
  mutationId: id,
  /** refused: by the rules of handing in · surrendered: by a device that is shut out · imported: from a saved copy. */
  source: z.enum(QUARANTINE_SOURCES),
  personName: z.string(),
  deviceName: z.string(),
  /** Reference of the building it is about; null when that cannot be read from it. */
  buildingReference: z.string().nullable(),
  reason: problem,
  /** Word for word what the device sent. */
  payload: z.unknown(),
  receivedAt: moment,
  state: z.enum(QUARANTINE_STATES),
  settledByName: z.string().nullable(),
  settledAt: moment.nullable(),
})
export type QuarantineEntry = z.infer<typeof quarantineEntry>

export const listQuarantine = defineEndpoint({
  method: 'GET',
  path: '/quarantine',
  audience: ['steward'],
  summary: 'Work that was set apart, newest first.',
  params: nothing,
  query: z.object({
    state: z.enum(QUARANTINE_STATES).default('waiting'),
    limit: z.coerce.number().int().min(1).max(500).default(100),
  }),
  body: nothing,
  response: z.object({ entries: z.array(quarantineEntry), count: z.number().int() }),
})

/** With `set`, a mended content takes the place of what was sent; what was sent stays in the record. */
export const releaseQuarantined = defineEndpoint({
  method: 'POST',
  path: '/quarantine/:mutationId/release',
  audience: ['steward'],
  summary: 'Let work that was set apart count, in the name of who recorded it, once.',
  params: z.object({ mutationId: id }),
  query: nothing,
  body: z.object({ set: z.record(z.string(), z.unknown()).optional() }),
  response: z.object({ outcome: z.enum(['applied', 'already-applied']), change: z.number().int().nullable() }),
})

export const discardQuarantined = defineEndpoint({
  method: 'POST',
  path: '/quarantine/:mutationId/discard',
  audience: ['steward'],
  summary: 'Say that work that was set apart shall not count. It stays readable.',
  params: z.object({ mutationId: id }),
  query: nothing,
  body: z.object({ why: typedText(500) }),
  response: z.object({ state: z.literal('discarded') }),
})

/** What became of a file: counted, so that it can be compared with what its person says. */
export const bagReceipt = z.object({
  /** Entries that now wait for a steward, of this file. */
  takenCount: z.number().int(),
  /** Entries that the server knew already. */
  knownCount: z.number().int(),
  /** SHA-256 of the bag this is the receipt for. */
  sha256: z.string(),
})

export const importBag = defineEndpoint({
  method: 'POST',
  path: '/quarantine/import',
  audience: ['steward'],
  summary: 'Read in a copy that a phone saved to a file; every entry waits for a decision.',
  params: nothing,
  query: nothing,
  body: bagFile,
  response: bagReceipt.extend({ isSigned: z.boolean(), personName: z.string() }),
})
