/** Where photo bytes lie. Names are made from digests by the store, never from what a client sent. */
export interface PhotoStore {
  /** Bytes of an unfinished upload so far; 0 when there is none. */
  partialBytes(organisationId: string, photoId: string): Promise<number>
  appendPartial(organisationId: string, photoId: string, offset: number, chunk: Uint8Array): Promise<void>
  readPartial(organisationId: string, photoId: string): Promise<Uint8Array>
  dropPartial(organisationId: string, photoId: string): Promise<void>
  /** Stores bytes under their digest, whole or not at all. */
  put(organisationId: string, sha256: string, bytes: Uint8Array): Promise<void>
  get(organisationId: string, sha256: string): Promise<Uint8Array | null>
  remove(organisationId: string, sha256: string): Promise<void>
}
