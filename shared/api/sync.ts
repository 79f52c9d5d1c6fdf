import { z } from 'zod'
import { bagFile, devicePublicKey } from '@/shared/schemas/bagFile'
import { editionForDevice } from '@/shared/schemas/factorBook'
import { id, moment, typedText } from '@/shared/schemas/primitives'
import { change, mutationOutcome, PULL_LIMIT, PUSH_LIMIT } from '@/shared/schemas/sync'
import { defineEndpoint, nothing } from './defineEndpoint'
import { bagReceipt } from './quarantine'

/**
 * Mutations arrive unparsed: each is judged for itself, so that one bad one is set apart
 * with its reason and the others go on.
 */
export const pushMutations = defineEndpoint({
  method: 'POST',
  path: '/sync/push',
  audience: ['surveyor'],
  summary: 'Hand in: send mutations in the order of their sequence numbers.',
  params: nothing,
  query: nothing,
  body: z.object({
    deviceId: id,
    schema: z.number().int().positive(),
    batch: z.array(z.unknown()).min(1).max(PUSH_LIMIT),
  }),
  response: z.object({
    results: z.array(mutationOutcome),
    lastSeq: z.number().int(),
    serverTime: moment,
    minSchema: z.number().int(),
  }),
})

export const pullChanges = defineEndpoint({
  method: 'GET',
  path: '/sync/pull',
  audience: ['surveyor'],
  summary: 'Everything of my beats that changed after the cursor.',
  params: nothing,
  query: z.object({
    deviceId: id,
    schema: z.coerce.number().int().positive(),
    cursor: z.string().max(2_000).optional(),
    limit: z.coerce.number().int().min(1).max(PULL_LIMIT).default(500),
  }),
  body: nothing,
  response: z.object({
    changes: z.array(change),
    cursor: z.string(),
    more: z.boolean(),
    /** Highest sequence number of this device that the snapshot of this page contains. */
    ackSeq: z.number().int(),
    scope: z.object({ epoch: z.number().int(), beatIds: z.array(id) }),
    /** On the last page: how many entities of each type the device must hold, and the XOR of their digests. */
    digest: z.object({ count: z.number().int(), xor64: z.string() }).optional(),
    serverTime: moment,
    minSchema: z.number().int(),
  }),
})

/**
 * A phone whose numbers stand for other work (restored from a copy, or copied) takes a new device id and numbers its bag
 * from 1, with the same mutation ids. The session goes on under the new id; asking twice with one id is harmless.
 */
export const renewDevice = defineEndpoint({
  method: 'POST',
  path: '/sync/device',
  audience: ['surveyor'],
  summary: 'Go on in this session under a new device id.',
  params: nothing,
  query: nothing,
  body: z.object({ deviceId: id, name: typedText(120) }),
  response: z.object({ accessToken: z.string(), expiresInS: z.number().int() }),
})

/** The key by which a device proves its bag when it has no session any more; its private half never leaves the device. */
export const enrolDeviceKey = defineEndpoint({
  method: 'POST',
  path: '/sync/device-key',
  audience: ['surveyor'],
  summary: 'Remember the public key of this device, once.',
  params: nothing,
  query: nothing,
  body: z.object({ deviceId: id, publicKey: devicePublicKey }),
  response: z.object({ isEnrolled: z.literal(true) }),
})

/**
 * For a device or person that is shut out: the signature of the device is the only proof. Nothing of the bag counts until
 * a steward releases it, and nothing but the receipt comes back.
 */
export const surrenderBag = defineEndpoint({
  method: 'POST',
  path: '/sync/surrender',
  audience: 'public',
  summary: 'Hand a signed bag over to the stewards from a device that is shut out.',
  params: nothing,
  query: nothing,
  body: bagFile,
  response: bagReceipt,
})

/** The factor book as the device needs it for the instant estimate. */
export const readDeviceEdition = defineEndpoint({
  method: 'GET',
  path: '/sync/edition',
  audience: ['surveyor'],
  summary: 'Latest issued edition, compact, for estimates without network.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: editionForDevice,
})

export const declareUpload = defineEndpoint({
  method: 'POST',
  path: '/photos/uploads',
  audience: ['surveyor'],
  summary: 'Begin or resume the upload of a photo whose mutation was handed in.',
  params: nothing,
  query: nothing,
  body: z.object({ photoId: id, sha256: z.string().regex(/^[0-9a-f]{64}$/), bytes: z.number().int().positive() }),
  response: z.object({ state: z.enum(['stored', 'partial', 'refused']), offset: z.number().int() }),
})

/**
 * Body is the raw chunk (application/offset+octet-stream, at most 256 KiB); headers
 * `Upload-Offset` and `Upload-Checksum: sha256 <base64>`. 409 answers the true offset.
 */
export const appendUpload = defineEndpoint({
  method: 'PATCH',
  path: '/photos/uploads/:photoId',
  audience: ['surveyor'],
  summary: 'Append one chunk of a photo; the last one stores it after its whole digest is right.',
  params: z.object({ photoId: id }),
  query: nothing,
  body: z.unknown(),
  response: z.object({ state: z.enum(['stored', 'partial', 'refused']), offset: z.number().int() }),
})

/** Answers image bytes, not JSON; `size` chooses the stored picture or its thumbnail. */
export const readPhoto = defineEndpoint({
  method: 'GET',
  path: '/photos/:photoId',
  audience: ['planner', 'surveyor'],
  summary: 'A stored photo.',
  params: z.object({ photoId: id }),
  query: z.object({ size: z.enum(['full', 'thumbnail']).default('full') }),
  body: nothing,
  response: z.unknown(),
})
