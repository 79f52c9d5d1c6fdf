import type { Actor } from '@/server/database'
import { conflictWith } from '@/server/errors'
import { readUploadPhoto } from '@/server/queries/readUploadPhoto'
import { requirePhotoRoom } from '@/server/queries/requirePhotoRoom'
import { storePhoto, type PhotoParts } from './storePhoto'

/**
 * Begins an upload or says where it goes on; ends one whose bytes are all there (rule U2).
 *
 * @throws {Refusal} `not-found` before the photo's mutation is applied, `photo-differs`, `digest-wrong`,
 * `no-room-left`, `too-many-unfinished`
 */
export async function declareUpload(
  parts: PhotoParts,
  actor: Actor,
  { photoId, sha256, bytes }: { photoId: string; sha256: string; bytes: number },
): Promise<{ state: 'stored' | 'partial' | 'refused'; offset: number }> {
  const photo = await parts.database.withScope(actor, (scope) => readUploadPhoto(scope, photoId), { readOnly: true })
  if (photo.sha256 !== sha256 || photo.bytes !== bytes) throw differs()
  if (photo.state === 'stored' || photo.state === 'refused') return { state: photo.state, offset: bytes }
  const offset = await parts.photoStore.partialBytes(actor.organisationId, photoId)
  if (offset === 0) {
    await parts.database.withScope(actor, (scope) => requirePhotoRoom(scope, { photoId, bytes }), { readOnly: true })
  }
  if (offset < bytes) return { state: 'partial', offset }
  return { state: await storePhoto(parts, actor, photo), offset }
}

const differs = () =>
  conflictWith(
    'photo-differs',
    'This photo was announced with another digest or size. Nothing was changed; the photo is safe on the device.',
  )
