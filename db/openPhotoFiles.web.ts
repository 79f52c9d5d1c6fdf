import { answered, done, openIndexedStore } from './indexedStore'
import type { PhotoFiles } from './photoFiles.types'

const STORE = 'photos'

/** Photos of one person in IndexedDB; SQLite in the browser returns wrong bytes for rows of them. */
export async function openPhotoFiles(name: string): Promise<PhotoFiles> {
  const database = await openIndexedStore(`${name}-photos`, STORE)
  const store = (mode: IDBTransactionMode) => database.transaction(STORE, mode, { durability: 'strict' })
  return {
    async write(sha256, bytes) {
      const transaction = store('readwrite')
      transaction.objectStore(STORE).put(bytes, sha256)
      await done(transaction)
    },
    async read(sha256) {
      const found: unknown = await answered(store('readonly').objectStore(STORE).get(sha256))
      return found instanceof Uint8Array ? found : null
    },
    async remove(sha256) {
      const transaction = store('readwrite')
      transaction.objectStore(STORE).delete(sha256)
      await done(transaction)
    },
  }
}
