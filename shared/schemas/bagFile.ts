import { z } from 'zod'
import { id, moment } from './primitives'

export const BAG_FILE_FORMAT = 'tallystone-bag'
export const BAG_FILE_VERSION = 2
/** Most mutations and most begun sheets in one file: more than a season of one person. */
const MOST_ENTRIES = 20_000

/**
 * What only one phone holds, word for word: for a file of last resort, and for a phone that is shut out. Mutations are
 * not parsed here, because each is judged for itself when somebody releases it.
 */
export const bagFile = z.object({
  format: z.literal(BAG_FILE_FORMAT),
  version: z.literal(BAG_FILE_VERSION),
  savedAt: moment,
  /** SHA-256 of the canonical JSON of `bag`, hexadecimal. */
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
  /** ECDSA P-256 with SHA-256 by the key of the device over {@link bagFileMessage}; absent where it has none. */
  signature: z
    .string()
    .regex(/^[A-Za-z0-9_-]{86}$/)
    .optional(),
  bag: z.looseObject({
    organisationId: id,
    personId: id,
    deviceId: id,
    mutations: z.array(z.unknown()).max(MOST_ENTRIES),
    drafts: z.array(z.unknown()).max(MOST_ENTRIES),
    photos: z.array(z.unknown()).max(MOST_ENTRIES),
    refused: z.array(z.unknown()).max(MOST_ENTRIES),
  }),
})
export type BagFile = z.infer<typeof bagFile>

/** A sheet that was begun and not put in the bag, as a file holds it. */
export const savedDraft = z.object({
  buildingId: id,
  answers: z.record(z.string(), z.unknown()),
  seen: z.number().int().nonnegative(),
  keptAt: z.string().max(40),
})

/** The public half of the key of a device: a point of P-256 as JSON Web Key, and nothing beside it. */
export const devicePublicKey = z.object({
  kty: z.literal('EC'),
  crv: z.literal('P-256'),
  x: z.string().regex(/^[A-Za-z0-9_-]{43}$/),
  y: z.string().regex(/^[A-Za-z0-9_-]{43}$/),
})
export type DevicePublicKey = z.infer<typeof devicePublicKey>

/** The text a device signs: its id binds the file to it, the digest binds all of its content. */
export function bagFileMessage(deviceId: string, sha256: string): string {
  return `${BAG_FILE_FORMAT}:${BAG_FILE_VERSION}:${deviceId}:${sha256}`
}
