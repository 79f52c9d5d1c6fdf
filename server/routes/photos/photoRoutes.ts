import express, { Router, type Request } from 'express'
import { z } from 'zod'
import { appendUpload, LARGEST_CHUNK_BYTES, type Chunk } from '@/server/commands/appendUpload'
import { declareUpload } from '@/server/commands/declareUpload'
import type { Context } from '@/server/context'
import { Refusal, unusable } from '@/server/errors'
import { createPhotoDecoder } from '@/server/jobs/photoDecoder'
import { throttleByKey } from '@/server/middleware/throttle'
import { readPhotoBytes } from '@/server/queries/readPhotoBytes'
import { alreadySent, mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/sync'

const MINUTE_MS = 60_000
/** 256 KiB each: about 400 MB a minute of one device. */
const CHUNKS_PER_MINUTE = 1_500
const CHUNK_TYPE = 'application/offset+octet-stream'

/** The lane of photo bytes, beside the one of records. */
export function photoRoutes(context: Context): Router {
  const router = Router()
  const parts = { ...context, decoder: createPhotoDecoder() }
  const perDevice = throttleByKey({
    windowMs: MINUTE_MS,
    limit: CHUNKS_PER_MINUTE,
    key: (request) => request.signedIn?.deviceId ?? '',
  })

  mount(router, endpoints.declareUpload, ({ signedIn, body }) => declareUpload(parts, signedIn, body), [perDevice])

  mount(
    router,
    endpoints.appendUpload,
    ({ signedIn, params, request }) => appendUpload(parts, signedIn, params.photoId, readChunk(request)),
    [perDevice, express.raw({ type: CHUNK_TYPE, limit: LARGEST_CHUNK_BYTES, inflate: false })],
  )

  mount(router, endpoints.readPhoto, async ({ signedIn, params, query, response }) => {
    const bytes = await readPhotoBytes(context, signedIn, { ...params, ...query })
    response
      .status(200)
      .set({
        'Content-Type': 'image/jpeg',
        'Content-Disposition': 'inline; filename="photo.jpg"',
        'Content-Security-Policy': "default-src 'none'; sandbox",
        'X-Content-Type-Options': 'nosniff',
        'Cache-Control': 'private, no-store',
        'Cross-Origin-Resource-Policy': 'same-origin',
      })
      .end(bytes)
    return alreadySent
  })

  return router
}

const chunkHeaders = z.object({
  'upload-offset': z.string().regex(/^\d{1,9}$/),
  'upload-checksum': z.string().regex(/^sha256 [A-Za-z0-9+/]{43}=$/),
})

/** @throws {Refusal} `wrong-kind-of-content`, `input-not-usable` naming the header */
function readChunk(request: Request): Chunk {
  const headers = chunkHeaders.safeParse(request.headers)
  if (!headers.success) {
    throw unusable(
      'The headers of this piece cannot be read. Nothing was kept; send it again.',
      headers.error.issues.map(({ path, code, message }) => ({
        pointer: `/headers/${path.join('/')}`,
        code,
        detail: message,
      })),
    )
  }
  if (!request.is(CHUNK_TYPE)) throw wrongKind()
  const body: unknown = request.body
  return {
    bytes: Buffer.isBuffer(body) ? body : new Uint8Array(),
    offset: Number(headers.data['upload-offset']),
    sha256: Buffer.from(headers.data['upload-checksum'].slice('sha256 '.length), 'base64').toString('hex'),
  }
}

const wrongKind = () =>
  new Refusal(415, 'wrong-kind-of-content', `A piece of a photo comes as ${CHUNK_TYPE}. Nothing was kept.`)
