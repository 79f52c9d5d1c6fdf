import type { PhotoFiles } from './photoFiles.types'

const STORE = 'photos'

/** Photos of one person in IndexedDB; SQLite in the browser returns wrong bytes for rows of them. */
export async function openPhotoFiles(name: string): Promise<PhotoFiles> {
  const database = await open(`${name}-photos`)
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

function open(name: string): Promise<IDBDatabase> {
  const request = indexedDB.open(name, 1)
  request.onupgradeneeded = () => request.result.createObjectStore(STORE)
  return answered(request)
}

function answered<Result>(request: IDBRequest<Result>): Promise<Result> {
  return new Promise((resolve, reject) => {
    request.onsuccess = () => resolve(request.result)
    request.onerror = () => reject(request.error)
  })
}

function done(transaction: IDBTransaction): Promise<void> {
  return new Promise((resolve, reject) => {
    transaction.oncomplete = () => resolve()
    transaction.onabort = () => reject(transaction.error)
    transaction.onerror = () => reject(transaction.error)
  })
}
