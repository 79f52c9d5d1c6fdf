import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import type { PhotoEntity } from '@/shared/schemas/sync'

/** A photo whose mutation was applied, of the acting person. */
export interface UploadPhoto {
  readonly photoId: string
  readonly sha256: string
  readonly bytes: number
  readonly state: PhotoEntity['state']
}

/** @throws {Refusal} `not-found` for a photo that was not handed in, was deleted, or is somebody else's */
export async function readUploadPhoto(scope: Scope, photoId: string): Promise<UploadPhoto> {
  const [row] = await scope.select<{ sha256: string; bytes: number; state: UploadPhoto['state'] }>(
    `SELECT sha256, bytes, state FROM photo
     WHERE organisation_id = $organisationId AND photo_id = $photoId AND taken_by = $personId AND deleted_at IS NULL`,
    { organisationId: scope.organisationId, personId: scope.personId, photoId },
  )
  if (!row) throw notFound('photo')
  return { photoId, ...row }
}
