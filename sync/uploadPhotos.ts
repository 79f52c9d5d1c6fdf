import { appendUpload, declareUpload } from '@/shared/api/sync'
import type { PhotoMeta } from '@/shared/schemas/sheet'
import type { SyncStore } from '@/db/syncStore.types'
import { ApiError } from './api/ApiError'
import { toRequest, type ApiClient } from './api/createApiClient'

const CHUNK_BYTES = 256 * 1024

export interface UploadParts {
  readonly store: SyncStore
  readonly api: ApiClient
  readonly onProgress: (done: number, total: number) => void
}

/**
 * Sends the photos whose record was handed in, in pieces that go on where they broke off (U2, U3).
 * A photo that is refused is marked with the reason; one that fails waits for the next time; the others go on.
 *
 * @throws {ApiError} of the first photo that failed, after the others were sent
 * @throws {UnreachableError} no answer
 */
export async function uploadPhotos(parts: UploadParts, signal?: AbortSignal): Promise<void> {
  const { store, onProgress } = parts
  const { photos: total } = await store.countWaiting()
  const failed = new Map<string, ApiError>()
  let done = 0
  for (;;) {
    const waiting = await store.nextPhotos(failed.size + 1)
    const photo = waiting.find(({ photoId }) => !failed.has(photoId))
    if (!photo) break
    onProgress(done, Math.max(total, done + 1))
    try {
      await uploadOne(parts, photo, signal)
    } catch (error) {
      if (!isOfThisPhoto(error)) throw error
      failed.set(photo.photoId, error)
    }
    done += 1
  }
  const [first] = failed.values()
  if (first) throw first
}

async function uploadOne({ store, api }: UploadParts, photo: PhotoMeta, signal?: AbortSignal): Promise<void> {
  const bytes = await store.readPhotoBytes(photo.sha256)
  if (!bytes) {
    await store.markPhoto(photo.photoId, 'refused', 'The picture is no longer on this device.')
    return
  }
  try {
    const state = await sendPieces(api, photo, bytes, signal)
    await store.markPhoto(photo.photoId, state === 'refused' ? 'refused' : 'sent', null)
  } catch (error) {
    if (!(error instanceof ApiError) || !isFinal(error)) throw error
    await store.markPhoto(photo.photoId, 'refused', error.problem.detail)
  }
}

/** Others may well be taken where this one was not. */
function isOfThisPhoto(error: unknown): error is ApiError {
  return error instanceof ApiError && [409, 422, 500].includes(error.status)
}

/** Asking again would bring the same answer. */
function isFinal({ status, code }: ApiError): boolean {
  return status === 404 || status === 413 || code === 'photo-differs' || code === 'photo-refused'
}

async function sendPieces(api: ApiClient, photo: PhotoMeta, bytes: Uint8Array, signal?: AbortSignal) {
  const { photoId, sha256 } = photo
  let progress = await api.call(declareUpload, { body: { photoId, sha256, bytes: bytes.length } }, signal)
  let repeats = 0
  while (progress.state === 'partial') {
    try {
      progress = await sendPiece(api, photoId, bytes, progress.offset, signal)
    } catch (error) {
      const { expected } = error instanceof ApiError ? error.problem : {}
      repeats += 1
      if (!(error instanceof ApiError) || ![409, 422].includes(error.status) || repeats > 8) throw error
      progress = { state: 'partial', offset: expected ?? progress.offset }
    }
  }
  return progress.state
}

async function sendPiece(api: ApiClient, photoId: string, bytes: Uint8Array, offset: number, signal?: AbortSignal) {
  const chunk = new Uint8Array(bytes.slice(offset, offset + CHUNK_BYTES))
  const digest = new Uint8Array(await crypto.subtle.digest('SHA-256', chunk))
  const { path } = toRequest(appendUpload, { params: { photoId } })
  const response = await api.send('PATCH', path, {
    body: chunk,
    headers: {
      'Content-Type': 'application/offset+octet-stream',
      'Upload-Offset': String(offset),
      'Upload-Checksum': `sha256 ${btoa(String.fromCharCode(...digest))}`,
    },
    ...(signal ? { signal } : {}),
  })
  return appendUpload.response.parse(await response.json()) as {
    state: 'stored' | 'partial' | 'refused'
    offset: number
  }
}
