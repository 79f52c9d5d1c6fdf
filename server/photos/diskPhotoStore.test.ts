import { createHash, randomUUID } from 'node:crypto'
import { mkdirSync, mkdtempSync, readdirSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { createDiskPhotoStore } from './diskPhotoStore'

const root = mkdtempSync(path.join(os.tmpdir(), 'tallystone-store-'))
afterAll(() => rmSync(root, { recursive: true, force: true }))

const store = createDiskPhotoStore(root)
const bytesOf = (text: string) => new TextEncoder().encode(text)
const digestOf = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex')
const filesBelow = (folder: string) =>
  readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(folder, path.join(entry.parentPath, entry.name)))

describe('photos on disk', () => {
  it('stores bytes under a name of their digest, in the folder of their organisation only', async () => {
    const [one, other] = [randomUUID(), randomUUID()]
    const bytes = bytesOf('a picture')
    const digest = digestOf(bytes)

    await store.put(one, digest, bytes)
    await store.put(one, digest, bytes)

    expect(filesBelow(path.join(root, one))).toEqual([path.join(digest.slice(0, 2), digest.slice(2))])
    expect(Buffer.from((await store.get(one, digest)) ?? [])).toEqual(Buffer.from(bytes))
    expect(await store.get(other, digest)).toBeNull()
    await store.remove(one, digest)
    expect(await store.get(one, digest)).toBeNull()
  })

  it('grows an unfinished upload from an offset, and cuts off what was written beyond it', async () => {
    const [organisation, photo] = [randomUUID(), randomUUID()]

    expect(await store.partialBytes(organisation, photo)).toBe(0)
    await store.appendPartial(organisation, photo, 0, bytesOf('abcdef'))
    await store.appendPartial(organisation, photo, 3, bytesOf('XY'))

    expect(new TextDecoder().decode(await store.readPartial(organisation, photo))).toBe('abcXY')
    expect(await store.partialBytes(organisation, photo)).toBe(5)
    await expect(store.appendPartial(organisation, photo, 9, bytesOf('z'))).rejects.toThrow(/shorter/)
    await store.dropPartial(organisation, photo)
    expect((await store.readPartial(organisation, photo)).length).toBe(0)
  })

  it.each([
    ['of other folders', '../../x'],
    ['with NUL', 'a\u0000b'],
    ['of 4 kB', 'x'.repeat(4_096)],
    ['that is written backwards', '\u202egpj.exe'],
    ['of a file of the machine', '/etc/passwd'],
  ])('M9 makes no path of a name %s', async (_kind, name) => {
    const organisation = randomUUID()

    await store.appendPartial(organisation, name, 0, bytesOf('x'))

    expect(filesBelow(path.join(root, organisation))).toEqual([expect.stringMatching(/^partial[/\\][0-9a-f]{64}$/)])
    await expect(async () => store.put(organisation, name, bytesOf('x'))).rejects.toThrow(/named by its digest/)
    await expect(async () => store.put(name, '0'.repeat(64), bytesOf('x'))).rejects.toThrow(/organisation/)
  })

  it('leaves nothing behind when a photo cannot be written', async () => {
    const organisation = randomUUID()
    const bytes = bytesOf('x')
    const digest = digestOf(bytes)
    mkdirSync(path.join(root, organisation, digest.slice(0, 2), digest.slice(2)), { recursive: true })

    await expect(store.put(organisation, digest, bytes)).rejects.toThrow()

    expect(filesBelow(path.join(root, organisation))).toEqual([])
  })
})
