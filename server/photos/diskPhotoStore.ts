import { createHash, randomUUID } from 'node:crypto'
import { mkdir, open, readFile, rename, rm, stat } from 'node:fs/promises'
import path from 'node:path'
import type { PhotoStore } from './photoStore'

const SHA256 = /^[0-9a-f]{64}$/
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/
/** A folder holds names of others too; only we read it. */
const FOLDER_MODE = 0o700
const FILE_MODE = 0o600

/**
 * Photos in files below one folder: `organisation/ab/cdef…` by the digest of their bytes, unfinished uploads in
 * `organisation/partial/` by the digest of the photo's id. A stored file appears whole or not at all.
 *
 * @param root folder that nothing else writes to; made when it is not there
 */
export function createDiskPhotoStore(root: string): PhotoStore {
  const partialPath = (organisationId: string, photoId: string) =>
    path.join(root, folderOf(organisationId), 'partial', createHash('sha256').update(photoId).digest('hex'))
  const storedPath = (organisationId: string, sha256: string) => {
    if (!SHA256.test(sha256)) throw new Error('a stored photo is named by its digest')
    return path.join(root, folderOf(organisationId), sha256.slice(0, 2), sha256.slice(2))
  }
  return {
    async partialBytes(organisationId, photoId) {
      return (await unlessMissing(stat(partialPath(organisationId, photoId))))?.size ?? 0
    },
    appendPartial: (organisationId, photoId, offset, chunk) =>
      writeFrom(partialPath(organisationId, photoId), offset, chunk),
    async readPartial(organisationId, photoId) {
      return (await unlessMissing(readFile(partialPath(organisationId, photoId)))) ?? new Uint8Array()
    },
    dropPartial: (organisationId, photoId) => rm(partialPath(organisationId, photoId), { force: true }),
    put: (organisationId, sha256, bytes) => putWhole(storedPath(organisationId, sha256), bytes),
    async get(organisationId, sha256) {
      return (await unlessMissing(readFile(storedPath(organisationId, sha256)))) ?? null
    },
    remove: (organisationId, sha256) => rm(storedPath(organisationId, sha256), { force: true }),
  }
}

function folderOf(organisationId: string): string {
  if (!UUID.test(organisationId)) throw new Error('photos lie in the folder of an organisation id')
  return organisationId
}

/** What lay beyond the offset is cut off: a chunk that was half written before is written again. */
async function writeFrom(file: string, offset: number, chunk: Uint8Array): Promise<void> {
  await mkdir(path.dirname(file), { recursive: true, mode: FOLDER_MODE })
  const handle = await open(file, offset === 0 ? 'w' : 'r+', FILE_MODE)
  try {
    if ((await handle.stat()).size < offset) throw new Error('the unfinished upload is shorter than the offset')
    await handle.truncate(offset)
    await handle.write(chunk, 0, chunk.length, offset)
    await handle.sync()
  } finally {
    await handle.close()
  }
}

async function putWhole(file: string, bytes: Uint8Array): Promise<void> {
  await mkdir(path.dirname(file), { recursive: true, mode: FOLDER_MODE })
  const beside = `${file}.${randomUUID()}`
  try {
    const handle = await open(beside, 'wx', FILE_MODE)
    try {
      await handle.writeFile(bytes)
      await handle.sync()
    } finally {
      await handle.close()
    }
    await rename(beside, file)
    await syncFolder(path.dirname(file))
  } catch (error) {
    await rm(beside, { force: true })
    throw error
  }
}

async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}

async function unlessMissing<Value>(reading: Promise<Value>): Promise<Value | undefined> {
  try {
    return await reading
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return undefined
    throw error
  }
}
