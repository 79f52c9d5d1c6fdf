import { createHmac, timingSafeEqual } from 'node:crypto'
import { keyFor } from '@/server/middleware/accessToken'

const UUID_BYTES = 16
const GENERATION_BYTES = 4
const SECRET_BYTES = 32
const MAC_BYTES = 16
const BODY_BYTES = 2 * UUID_BYTES + GENERATION_BYTES + SECRET_BYTES

/** A refresh token taken apart: one generation of one session. */
export interface RefreshToken {
  readonly organisationId: string
  readonly sessionId: string
  readonly generation: number
  readonly secret: Buffer
}

/**
 * Writes a refresh token: session, generation, 256 secret bits, and a seal of the server over them. The seal lets the
 * server tell a spent token of its own (whose family must end) from one that somebody made up (which means nothing).
 */
export function writeRefreshToken(token: RefreshToken, sessionSecret: string): string {
  const body = Buffer.concat([
    uuidBytes(token.organisationId),
    uuidBytes(token.sessionId),
    generationBytes(token.generation),
    token.secret,
  ])
  return Buffer.concat([body, seal(body, sessionSecret)]).toString('base64url')
}

/** @returns undefined for everything that this server did not write */
export function readRefreshToken(text: string, sessionSecret: string): RefreshToken | undefined {
  const bytes = Buffer.from(text, 'base64url')
  if (bytes.length !== BODY_BYTES + MAC_BYTES) return undefined
  const body = bytes.subarray(0, BODY_BYTES)
  if (!timingSafeEqual(bytes.subarray(BODY_BYTES), seal(body, sessionSecret))) return undefined
  return {
    organisationId: uuidText(body.subarray(0, UUID_BYTES)),
    sessionId: uuidText(body.subarray(UUID_BYTES, 2 * UUID_BYTES)),
    generation: body.readUInt32BE(2 * UUID_BYTES),
    secret: body.subarray(2 * UUID_BYTES + GENERATION_BYTES),
  }
}

/**
 * The successor of a token under one rotation: the same rotation gives the same successor, so a lost answer can be
 * asked for again.
 *
 *     secret = HMAC(key, session ‖ generation + 1 ‖ rotation)
 *
 * @param rotationId 128 random bits of the device, hex
 */
export function childOf(parent: RefreshToken, rotationId: string, sessionSecret: string): RefreshToken {
  const generation = parent.generation + 1
  const secret = createHmac('sha256', keyFor('refresh-child', sessionSecret))
    .update(uuidBytes(parent.sessionId))
    .update(generationBytes(generation))
    .update(Buffer.from(rotationId, 'hex'))
    .digest()
  return { ...parent, generation, secret }
}

function seal(body: Buffer, sessionSecret: string): Buffer {
  return createHmac('sha256', keyFor('refresh-seal', sessionSecret)).update(body).digest().subarray(0, MAC_BYTES)
}

function generationBytes(generation: number): Buffer {
  const bytes = Buffer.alloc(GENERATION_BYTES)
  bytes.writeUInt32BE(generation)
  return bytes
}

function uuidBytes(uuid: string): Buffer {
  return Buffer.from(uuid.replaceAll('-', ''), 'hex')
}

function uuidText(bytes: Buffer): string {
  return bytes.toString('hex').replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5')
}
