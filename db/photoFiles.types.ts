/** The bytes of photos, by their digest, beside the database. */
export interface PhotoFiles {
  write(sha256: string, bytes: Uint8Array): Promise<void>
  read(sha256: string): Promise<Uint8Array | null>
  remove(sha256: string): Promise<void>
}
