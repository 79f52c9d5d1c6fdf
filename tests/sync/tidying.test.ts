import { createHash, randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { tidySync } from '@/server/commands/tidySync'
import { tidyAll } from '@/server/jobs/startTidying'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { assertNothingLost } from './testPhone'
import { testTown, type TestTown } from './testTown'

let testApp: TestApp
let town: TestTown
beforeAll(async () => {
  testApp = await createTestApp()
})
afterAll(() => testApp.close())
beforeEach(async () => {
  town = await testTown(testApp)
})

const DAY_MS = 86_400_000
const later = (days: number) => ({
  ...testApp.context,
  now: () => new Date(testApp.context.now().getTime() + days * DAY_MS),
})
const tidyIn = (days: number) => tidySync(later(days), town.organisationId)
const storeys = (aboveGround: number) => ({ storeys: { aboveGround, knownBy: 'seen' as const } })

function photoOf(bytes = 40) {
  const photoId = randomUUID()
  const [sheetId] = town.round.buildingIds
  const core = { photoId, sheetId, sha256: 'ab'.repeat(32), bytes, mime: 'image/jpeg', widthPx: 4, heightPx: 3 }
  town.phone.save({
    op: 'set',
    type: 'photo',
    entity: photoId,
    set: { ...core, tag: 'street-front', takenAt: '2026-11-30T10:00:00Z' },
  })
  return { photoId, sha256: core.sha256, bytes }
}
const declare = (body: object) => testApp.http.post('/api/v1/photos/uploads').set(town.surveyor.bearer).send(body)

describe('F26 a device that comes back after 200 days', () => {
  it('L7 is told to begin from the start once deletions are forgotten, and its bag is taken', async () => {
    const away = await town.secondPhone()
    const { photoId } = photoOf()
    await town.phone.handIn()
    await away.pull()
    expect(away.of('photo')).toHaveLength(1)
    town.phone.save({ op: 'delete', type: 'photo', entity: photoId })
    await town.phone.handIn()
    away.saveSheet(town.round.buildingIds[1]!, storeys(4))

    expect(await tidyIn(179)).toMatchObject({ tombstones: 0 })
    expect(await tidyIn(200)).toMatchObject({ tombstones: 1 })
    await expect(away.pull()).rejects.toMatchObject({ status: 410, code: 'resync-required' })

    away.base.clear()
    away.cursor = undefined
    await away.handIn()
    expect([away.of('photo'), away.bag]).toEqual([[], []])
    await assertNothingLost(testApp, [town.phone, away])
  })

  it('is not sent back to the start when nothing was forgotten that it had not seen', async () => {
    const { photoId } = photoOf()
    await town.phone.handIn()
    town.phone.save({ op: 'delete', type: 'photo', entity: photoId })
    await town.phone.handIn()
    await tidyIn(200)

    await expect(town.phone.pull()).resolves.toMatchObject({ more: false })
  })

  it('keeps a sheet that was deleted, however long ago', async () => {
    const [sheetId] = town.round.buildingIds
    town.phone.saveSheet(sheetId!, storeys(4))
    town.phone.save({ op: 'delete', type: 'sheet', entity: sheetId! })
    await town.phone.handIn()

    await tidyIn(2_000)

    const rows = await testApp.owner.rows('SELECT answers FROM sheet WHERE sheet_id = $sheetId', { sheetId })
    expect(rows).toHaveLength(1)
  })
})

describe('bytes of photos', () => {
  it('U2 that never ended are forgotten after 14 days, and the photo begins again', async () => {
    const photo = photoOf(400_000)
    await town.phone.handIn()
    const chunk = Buffer.alloc(1_000, 3)
    const answer = await testApp.http
      .patch(`/api/v1/photos/uploads/${photo.photoId}`)
      .set(town.surveyor.bearer)
      .set('Content-Type', 'application/offset+octet-stream')
      .set('Upload-Offset', '0')
      .set('Upload-Checksum', `sha256 ${createHash('sha256').update(chunk).digest('base64')}`)
      .send(chunk)
    expect(answer.body).toEqual({ state: 'partial', offset: 1_000 })

    expect(await tidyIn(13)).toMatchObject({ uploads: 0 })
    expect((await declare(photo)).body).toEqual({ state: 'partial', offset: 1_000 })
    await tidyAll(later(15))

    expect((await declare(photo)).body).toEqual({ state: 'partial', offset: 0 })
  })

  it('are refused beyond the room of the organisation, and taken when there is room again', async () => {
    const photo = photoOf(5_000)
    await town.phone.handIn()
    const setRoom = (room: number) =>
      testApp.owner.run('UPDATE organisation SET photo_quota_bytes = $room WHERE organisation_id = $organisationId', {
        room,
        organisationId: town.organisationId,
      })
    await setRoom(4_999)
    const refused = await declare(photo)
    await setRoom(5_000)

    expect([refused.status, refused.body.code, refused.get('Retry-After')]).toEqual([507, 'no-room-left', '3600'])
    expect((await declare(photo)).status).toBe(200)
  })

  it('are refused beside fifty uploads that never ended', async () => {
    const first = photoOf()
    for (let turn = 0; turn < 50; turn += 1) photoOf()
    await town.phone.handIn()
    await testApp.owner.run(
      'UPDATE photo SET upload_at = now() WHERE organisation_id = $organisationId AND photo_id <> $photoId',
      { organisationId: town.organisationId, photoId: first.photoId },
    )

    expect((await declare(first)).body.code).toBe('too-many-unfinished')
  })
})
