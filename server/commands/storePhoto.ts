import { createHash } from 'node:crypto'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { Refusal } from '@/server/errors'
import type { PhotoDecoder, ReencodedPhoto } from '@/server/jobs/photoDecoder'
import { judgePhoto } from '@/server/photos/judgePhoto'
import { readUploadPhoto, type UploadPhoto } from '@/server/queries/readUploadPhoto'
import { takeChangeNumbers } from './takeChangeNumbers'

export type PhotoParts = Pick<Context, 'database' | 'photoStore' | 'log' | 'now'> & { readonly decoder: PhotoDecoder }

/**
 * Ends an upload whose bytes are all there: whole digest, content, storing, and a change number for the new state
 * (rules U4 to U6). Safe to repeat and to break off: bytes are stored before the row says so, and dropped after.
 *
 * @throws {Refusal} `digest-wrong`, `no-room-left`
 */
export async function storePhoto(parts: PhotoParts, actor: Actor, photo: UploadPhoto): Promise<'stored' | 'refused'> {
  const { database, photoStore } = parts
  const { organisationId } = actor
  const bytes = await photoStore.readPartial(organisationId, photo.photoId)
  if (sha256Of(bytes) !== photo.sha256) {
    const { state } = await database.withScope(actor, (scope) => readUploadPhoto(scope, photo.photoId), {
      readOnly: true,
    })
    if (state === 'stored' || state === 'refused') return state
    await photoStore.dropPartial(organisationId, photo.photoId)
    throw digestWrong()
  }
  const verdict = await judgePhoto(parts.decoder, bytes)
  const state =
    'photo' in verdict
      ? await keep(parts, actor, photo, verdict.photo)
      : await refuse(parts, actor, photo, verdict.refusal)
  await photoStore.dropPartial(organisationId, photo.photoId)
  return state
}

async function keep(
  { database, photoStore }: PhotoParts,
  actor: Actor,
  { photoId }: UploadPhoto,
  { jpeg, thumbnail, widthPx, heightPx }: ReencodedPhoto,
): Promise<'stored'> {
  const digests = { stored: sha256Of(jpeg), thumbnail: sha256Of(thumbnail) }
  await withRoom(() => photoStore.put(actor.organisationId, digests.stored, jpeg))
  await withRoom(() => photoStore.put(actor.organisationId, digests.thumbnail, thumbnail))
  await database.withScope(actor, (scope) =>
    setState(scope, photoId, {
      sql: `state = 'stored', refusal = NULL, stored_sha256 = $stored, thumbnail_sha256 = $thumbnail,
        width_px = $widthPx, height_px = $heightPx`,
      bind: { ...digests, widthPx, heightPx },
    }),
  )
  return 'stored'
}

async function refuse(
  { database, log }: PhotoParts,
  actor: Actor,
  { photoId }: UploadPhoto,
  refusal: string,
): Promise<'refused'> {
  await database.withScope(actor, (scope) =>
    setState(scope, photoId, { sql: `state = 'refused', refusal = $refusal`, bind: { refusal } }),
  )
  log.warn({ photoId, refusal }, 'photo refused')
  return 'refused'
}

/** A second request that ends the same upload changes nothing more. */
async function setState(scope: Scope, photoId: string, { sql, bind }: { sql: string; bind: object }): Promise<void> {
  const change = await takeChangeNumbers(scope, 1)
  await scope.execute(
    `UPDATE photo SET ${sql}, change_no = $change, upload_at = NULL
     WHERE organisation_id = $organisationId AND photo_id = $photoId AND state IN ('declared', 'partial')`,
    { ...bind, organisationId: scope.organisationId, photoId, change },
  )
}

export function sha256Of(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex')
}

/** @throws {Refusal} `no-room-left` when the disk is full; other faults as they are */
export async function withRoom<Result>(write: () => Promise<Result>): Promise<Result> {
  try {
    return await write()
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? error.code : undefined
    if (code !== 'ENOSPC' && code !== 'EDQUOT') throw error
    throw new Refusal(
      507,
      'no-room-left',
      'The server has no room for photos now. The record is safe there, the photo on the device; it is sent again later.',
      [],
      { 'Retry-After': '600' },
    )
  }
}

const digestWrong = () =>
  new Refusal(
    422,
    'digest-wrong',
    'The photo that came is not the one that was announced. It is dropped here; send it again from the device.',
    [{ pointer: '/body', code: 'digest-wrong', detail: 'the SHA-256 of all bytes differs' }],
    {},
    0,
  )
