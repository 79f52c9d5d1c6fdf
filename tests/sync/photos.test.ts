import { createHash, randomUUID } from 'node:crypto'
import { Jimp } from 'jimp'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { buildPerson } from '@/tests/support/buildPerson'
import { buildPicture, hugeJpegHeader, hugePng, sha256Hex, withMetadata } from '@/tests/support/buildPicture'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'
import { testTown, type TestTown } from './testTown'

const CHUNK_BYTES = 262_144
let testApp: TestApp
let town: TestTown
let sheetId: string
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())
beforeEach(async () => {
  town = await testTown(testApp)
  sheetId = town.round.buildingIds[0] ?? ''
})

/** Keeps a photo in the bag and hands in its record. */
async function announce(bytes: Buffer, extra: object = {}) {
  const photoId = randomUUID()
  const set = {
    photoId,
    sheetId,
    sha256: sha256Hex(bytes),
    bytes: bytes.length,
    mime: 'image/jpeg',
    widthPx: 64,
    heightPx: 48,
    tag: 'street-front',
    takenAt: '2026-11-30T10:00:00Z',
    ...extra,
  }
  town.phone.save({ op: 'set', type: 'photo', entity: photoId, set })
  await town.phone.handIn()
  return { photoId, sha256: set.sha256, bytes: set.bytes }
}
const declare = (body: object, person: SignedInPerson = town.surveyor) =>
  testApp.http.post('/api/v1/photos/uploads').set(person.bearer).send(body)
const append = (photoId: string, offset: number, chunk: Buffer, person: SignedInPerson = town.surveyor) =>
  testApp.http
    .patch(`/api/v1/photos/uploads/${photoId}`)
    .set(person.bearer)
    .set('Content-Type', 'application/offset+octet-stream')
    .set('Upload-Offset', String(offset))
    .set('Upload-Checksum', `sha256 ${createHash('sha256').update(chunk).digest('base64')}`)
    .send(chunk)
const read = (photoId: string, person: SignedInPerson, size = 'full') =>
  testApp.http.get(`/api/v1/photos/${photoId}`).query({ size }).set(person.bearer)

async function upload(photo: { photoId: string }, bytes: Buffer) {
  for (let offset = 0; ; offset += CHUNK_BYTES) {
    const answer = await append(photo.photoId, offset, bytes.subarray(offset, offset + CHUNK_BYTES))
    if (answer.status !== 200 || answer.body.state !== 'partial') return answer
  }
}
const storedOf = async (photoId: string) => {
  const [row] = await testApp.owner.rows<{ stored_sha256: string }>(
    'SELECT stored_sha256 FROM photo WHERE photo_id = $photoId',
    { photoId },
  )
  return Buffer.from((await testApp.context.photoStore.get(town.organisationId, row?.stored_sha256 ?? '')) ?? [])
}

describe('a photo on its way', () => {
  it('U1 U5 U6 follows its record in pieces, is stored, and everybody learns of it by pull', async () => {
    const bytes = Buffer.concat([await buildPicture({ widthPx: 900, heightPx: 700 }), Buffer.alloc(CHUNK_BYTES, 7)])
    const photo = await announce(bytes)
    const other = await town.secondPhone()
    await other.pull()
    expect(other.of('photo')).toMatchObject([{ id: photo.photoId, fields: { state: 'declared' } }])

    expect((await declare(photo)).body).toEqual({ state: 'partial', offset: 0 })
    const answer = await upload(photo, bytes)
    await other.pull()

    expect(answer.body).toEqual({ state: 'stored', offset: bytes.length })
    expect(other.of('photo')).toMatchObject([
      { fields: { state: 'stored', refusal: null, widthPx: 900, heightPx: 700 } },
    ])
    expect((await declare(photo)).body).toEqual({ state: 'stored', offset: bytes.length })
    const full = await read(photo.photoId, town.planner)
    const thumbnail = await read(photo.photoId, town.surveyor, 'thumbnail')
    expect((await Jimp.fromBuffer(full.body as Buffer)).bitmap).toMatchObject({ width: 900, height: 700 })
    expect((await Jimp.fromBuffer(thumbnail.body as Buffer)).bitmap).toMatchObject({ width: 320 })
    expect(testApp.context.photoStore.partial.size).toBe(0)
  })

  it('U5 takes PNG as well, and makes large ones smaller', async () => {
    const bytes = await buildPicture({ widthPx: 2_600, heightPx: 300, kind: 'png' })
    const photo = await announce(bytes)

    await upload(photo, bytes)

    expect((await Jimp.fromBuffer(await storedOf(photo.photoId))).bitmap).toMatchObject({ width: 2_048 })
  })

  it('F8 U3 goes on from any cut to the byte, with no byte twice', async () => {
    const bytes = Buffer.concat([await buildPicture(), Buffer.alloc(700_000, 3)])
    const photo = await announce(bytes)
    let sent = 0
    for (let turn = 0; ; turn += 1) {
      const { offset, state } = (await declare(photo)).body as { offset: number; state: string }
      if (state === 'stored') break
      const chunk = bytes.subarray(offset, offset + 1 + ((turn * 97_001) % CHUNK_BYTES))
      sent += chunk.length
      const answer = await append(photo.photoId, offset, chunk)
      expect(answer.status).toBe(200)
    }

    expect(sent).toBe(bytes.length)
    expect(sha256Hex(await storedOf(photo.photoId))).toMatch(/^[0-9a-f]{64}$/)
  })

  it('U3 names the true offset when a piece comes twice or too early', async () => {
    const bytes = await buildPicture({ widthPx: 300, heightPx: 300 })
    const photo = await announce(bytes)
    await append(photo.photoId, 0, bytes.subarray(0, 100))

    for (const offset of [0, 50, 200]) {
      const answer = await append(photo.photoId, offset, bytes.subarray(offset, offset + 100))
      expect(answer.status).toBe(409)
      expect(answer.body).toMatchObject({ code: 'offset-conflict', expected: 100 })
      expect(answer.get('Upload-Offset')).toBe('100')
    }
    expect((await append(photo.photoId, 100, bytes.subarray(100))).body.state).toBe('stored')
  })

  it('U7 lets one of several equal pieces in that come at once', async () => {
    const bytes = await buildPicture({ widthPx: 300, heightPx: 300 })
    const photo = await announce(bytes)

    const answers = await Promise.all([1, 2, 3, 4].map(() => append(photo.photoId, 0, bytes.subarray(0, 500))))

    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409, 409])
    expect((await append(photo.photoId, 500, bytes.subarray(500))).body.state).toBe('stored')
  })

  it('U2 U3 U4 refuses what is damaged, too much, or not what was announced, and says what to do', async () => {
    const bytes = await buildPicture({ widthPx: 300, heightPx: 300 })
    const photo = await announce(bytes)
    const chunk = bytes.subarray(0, 100)

    const damaged = await append(photo.photoId, 0, chunk).set(
      'Upload-Checksum',
      `sha256 ${createHash('sha256').digest('base64')}`,
    )
    const headless = await append(photo.photoId, 0, chunk).set('Upload-Offset', '-1').set('Upload-Checksum', 'md5 x')
    const otherKind = await append(photo.photoId, 0, chunk).set('Content-Type', 'application/octet-stream')
    const tooMuch = await append(photo.photoId, 0, Buffer.concat([bytes, Buffer.alloc(10)]))
    const tooLarge = await append(photo.photoId, 0, Buffer.alloc(CHUNK_BYTES + 1))
    const otherSize = await declare({ ...photo, bytes: 5 })
    const otherBytes = await append(photo.photoId, 0, Buffer.alloc(bytes.length, 1))

    expect([damaged.status, damaged.body.code]).toEqual([422, 'checksum-wrong'])
    expect([headless.status, headless.body.faults.length]).toEqual([422, 2])
    expect([otherKind.status, tooMuch.status, tooLarge.status]).toEqual([415, 413, 413])
    expect([otherSize.status, otherSize.body.code]).toEqual([409, 'photo-differs'])
    expect([otherBytes.status, otherBytes.body.code, otherBytes.body.expected]).toEqual([422, 'digest-wrong', 0])
    expect((await declare(photo)).body).toEqual({ state: 'partial', offset: 0 })
    expect((await upload(photo, bytes)).body.state).toBe('stored')
  })

  it('F14 says so when the disk is full, keeps nothing half, and goes on later', async () => {
    const bytes = await buildPicture()
    const photo = await announce(bytes)
    const { put } = testApp.context.photoStore
    testApp.context.photoStore.put = () => Promise.reject(Object.assign(new Error('full'), { code: 'ENOSPC' }))

    const full = await upload(photo, bytes)
    testApp.context.photoStore.put = put

    expect([full.status, full.body.code, full.get('Retry-After')]).toEqual([507, 'no-room-left', '600'])
    expect((await declare(photo)).body).toEqual({ state: 'stored', offset: bytes.length })
  })
})

describe('what is no picture of ours', () => {
  const cases: [string, () => Promise<Buffer>, RegExp][] = [
    ['M7 a PNG of a few kB that says 19,000 by 19,000', async () => hugePng(19_000, 19_000), /361 million pixels/],
    ['M7 a JPEG header of 65,535 by 65,535', async () => hugeJpegHeader(), /million pixels/],
    [
      'M7 a picture that breaks off',
      async () => (await buildPicture({ widthPx: 400, heightPx: 400 })).subarray(0, 900),
      /damaged|breaks off/,
    ],
    [
      'M8 SVG',
      async () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>'),
      /not a JPEG or PNG/,
    ],
    ['M8 HTML', async () => Buffer.from('<!doctype html><script>alert(1)</script>'), /not a JPEG or PNG/],
    ['M8 PDF', async () => Buffer.from('%PDF-1.7 x'), /not a JPEG or PNG/],
    ['M8 ZIP', async () => Buffer.from('PK\u0003\u0004 x'), /not a JPEG or PNG/],
    ['M8 GIF', async () => Buffer.from('GIF89a\u0001\u0000\u0001\u0000'), /not a JPEG or PNG/],
    [
      'M8 the first bytes of a JPEG and other content',
      async () => Buffer.concat([hugeJpegHeader().subarray(0, 4), Buffer.alloc(500, 9)]),
      /not a JPEG|damaged/,
    ],
    [
      'M8 the header of a PNG and other content',
      async () => Buffer.concat([hugePng(20, 20).subarray(0, 33), Buffer.alloc(500, 9)]),
      /damaged/,
    ],
  ]

  it.each(cases)('%s is refused in words; the record stays', async (_kind, make, words) => {
    const bytes = await make()
    const photo = await announce(bytes)

    const answer = await upload(photo, bytes)
    await town.phone.pull()

    expect([answer.status, answer.body.state]).toEqual([200, 'refused'])
    expect(town.phone.of('photo')).toMatchObject([
      { fields: { state: 'refused', refusal: expect.stringMatching(words) } },
    ])
    expect((await declare(photo)).body.state).toBe('refused')
    expect((await read(photo.photoId, town.planner)).status).toBe(404)
    expect(testApp.context.photoStore.partial.size).toBe(0)
  })

  it('M10 stores nothing of the metadata, and nothing behind the end of the picture', async () => {
    const secret = 'Exif\u0000\u0000MM\u0000*GPSLatitude 48.1234 http://ns.adobe.com/xap/1.0/ Photoshop 3.0'
    const picture = withMetadata(await buildPicture(), secret)
    const bytes = Buffer.concat([picture, Buffer.from('<html><script>alert(1)</script></html>')])
    const photo = await announce(bytes)

    expect((await upload(photo, bytes)).body.state).toBe('stored')

    const stored = (await storedOf(photo.photoId)).toString('latin1')
    expect(stored.length).toBeGreaterThan(100)
    for (const trace of ['Exif', 'GPS', 'adobe', 'Photoshop', '<script', '<html']) expect(stored).not.toContain(trace)
  })
})

describe('who sees a photo', () => {
  it('M16 M17 U1 hides it from every other person, device-less or of another organisation, in the same words', async () => {
    const bytes = await buildPicture()
    const photo = await announce(bytes)
    const stranger = await testTown(testApp)
    const colleague = await signInAs(testApp, await buildPerson(testApp, { organisationId: town.organisationId }))
    const unannounced = { ...photo, photoId: randomUUID() }

    const refusals = [
      await declare(photo, stranger.surveyor),
      await declare(photo, colleague),
      await declare(unannounced),
      await append(photo.photoId, 0, bytes, colleague),
      await append(photo.photoId, 0, bytes, stranger.surveyor),
    ]
    await upload(photo, bytes)
    refusals.push(
      await read(photo.photoId, colleague),
      await read(photo.photoId, stranger.planner),
      await read(randomUUID(), town.planner),
    )
    refusals.push(await declare(photo, stranger.surveyor))

    for (const { status, body } of refusals) expect([status, body.detail]).toEqual([404, refusals[0]?.body.detail])
    expect((await read(photo.photoId, town.surveyor)).status).toBe(200)
  })

  it('M3 keeps photos of two organisations under one id apart', async () => {
    const bytes = await buildPicture()
    const photo = await announce(bytes)
    const stranger = await testTown(testApp)
    const mine = { photoId: photo.photoId, sheetId: stranger.round.buildingIds[0], sha256: 'b'.repeat(64), bytes: 9 }
    stranger.phone.save({
      op: 'set',
      type: 'photo',
      entity: photo.photoId,
      set: { ...mine, mime: 'image/png', widthPx: 1, heightPx: 1, tag: 'roof', takenAt: null },
    })
    await stranger.phone.handIn()

    expect(stranger.phone.of('photo')).toMatchObject([{ fields: { sha256: 'b'.repeat(64) } }])
    await town.phone.pull()
    expect(town.phone.of('photo')).toMatchObject([{ fields: { sha256: photo.sha256 } }])
  })

  it('M9 serves it as a picture and nothing else, under no name that came from outside', async () => {
    const bytes = await buildPicture()
    const photo = await announce(bytes)
    await upload(photo, bytes)

    const { headers } = await read(photo.photoId, town.planner)

    expect(headers).toMatchObject({
      'content-type': 'image/jpeg',
      'content-disposition': 'inline; filename="photo.jpg"',
      'content-security-policy': "default-src 'none'; sandbox",
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, no-store',
    })
    for (const name of testApp.context.photoStore.stored.keys()) expect(name).toMatch(/^[0-9a-f-]{36}\/[0-9a-f]{64}$/)
  })
})
