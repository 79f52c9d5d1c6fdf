import { answered, done, openIndexedStore } from './indexedStore'
import { BALLAST_BYTES, type Twin } from './twin.types'
import { readTwinTexts, toTwinText } from './twinText'

const STORE = 'twin'
const GENERATION = '#generation'

/** The twin of one person's bag in IndexedDB, which another fault hits than the files of SQLite; the ballast in a file. */
export async function openTwin(name: string): Promise<Twin> {
  const database = await openIndexedStore(`${name}-twin`, STORE)
  const write = async (work: (store: IDBObjectStore) => void) => {
    const transaction = database.transaction(STORE, 'readwrite', { durability: 'strict' })
    work(transaction.objectStore(STORE))
    await done(transaction)
  }
  const read = () => database.transaction(STORE, 'readonly').objectStore(STORE)
  return {
    put: (entries) => write((store) => entries.forEach((entry) => store.put(toTwinText(entry), entry.mutationId))),
    all: async () => readTwinTexts(await answered<unknown[]>(read().getAll())),
    async keepOnly(mutationIds) {
      const keys = await answered(read().getAllKeys())
      const others = keys.filter((key) => key !== GENERATION && !mutationIds.has(String(key)))
      if (others.length > 0) await write((store) => others.forEach((key) => store.delete(key)))
    },
    async readGeneration() {
      const found: unknown = await answered(read().get(GENERATION))
      return typeof found === 'number' ? found : 0
    },
    writeGeneration: (generation) => write((store) => store.put(generation, GENERATION)),
    ...ballastOf(`${name}-ballast`),
  }
}

/** A file gives its space back at once; a database does so later. */
function ballastOf(fileName: string): Pick<Twin, 'holdBallast' | 'dropBallast'> {
  const folder = () => navigator.storage.getDirectory()
  const isThere = async () => {
    try {
      const handle = await (await folder()).getFileHandle(fileName)
      return (await handle.getFile()).size > 0
    } catch (error) {
      if (error instanceof DOMException && error.name === 'NotFoundError') return false
      throw error
    }
  }
  return {
    async holdBallast() {
      if (await isThere()) return
      const handle = await (await folder()).getFileHandle(fileName, { create: true })
      const writing = await handle.createWritable()
      await writing.write(crypto.getRandomValues(new Uint8Array(65_536)))
      await writing.truncate(BALLAST_BYTES)
      await writing.close()
    },
    async dropBallast() {
      if (!(await isThere())) return false
      await (await folder()).removeEntry(fileName)
      return true
    },
  }
}
