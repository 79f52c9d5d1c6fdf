import type { PhotoStore } from '@/server/photos/photoStore'

export interface FakePhotoStore extends PhotoStore {
  readonly stored: Map<string, Uint8Array>
  readonly partial: Map<string, Uint8Array>
}

/** Photos in memory. */
export function fakePhotoStore(): FakePhotoStore {
  const stored = new Map<string, Uint8Array>()
  const partial = new Map<string, Uint8Array>()
  const key = (organisationId: string, name: string) => `${organisationId}/${name}`
  return {
    stored,
    partial,
    partialBytes: async (organisationId, photoId) => partial.get(key(organisationId, photoId))?.length ?? 0,
    async appendPartial(organisationId, photoId, offset, chunk) {
      const before = (partial.get(key(organisationId, photoId)) ?? new Uint8Array()).slice(0, offset)
      partial.set(key(organisationId, photoId), Buffer.concat([before, chunk]))
    },
    readPartial: async (organisationId, photoId) => partial.get(key(organisationId, photoId)) ?? new Uint8Array(),
    async dropPartial(organisationId, photoId) {
      partial.delete(key(organisationId, photoId))
    },
    async put(organisationId, sha256, bytes) {
      stored.set(key(organisationId, sha256), bytes)
    },
    get: async (organisationId, sha256) => stored.get(key(organisationId, sha256)) ?? null,
    async remove(organisationId, sha256) {
      stored.delete(key(organisationId, sha256))
    },
  }
}
