import { describe, expect, it } from 'vitest'
import { BEAT_ID, BUILDING_ID } from '@/tests/support/forgetfulServer'
import { buildBeat, buildBuilding } from '@/tests/support/buildFieldEntities'
import { memoryPhone } from '@/tests/support/memoryPhone'

async function phoneWithBeat() {
  const phone = await memoryPhone()
  await phone.sync.applyPage({
    cursor: '2',
    beatIds: [BEAT_ID],
    isLast: true,
    changes: [
      { type: 'beat', id: BEAT_ID, change: 1, fields: buildBeat() },
      { type: 'building', id: BUILDING_ID, change: 2, fields: buildBuilding(BEAT_ID) },
    ],
  })
  return phone
}

describe('createFieldStore', () => {
  it('keeps a draft and shows the sheet as started', async () => {
    const { field } = await phoneWithBeat()

    await field.keepDraft(BUILDING_ID, { notes: { text: 'scaffold' } })

    expect((await field.readBuilding(BUILDING_ID))?.state).toBe('started')
    expect((await field.readSheet(BUILDING_ID))?.draft.notes?.text).toBe('scaffold')
  })

  it('puts only what changed in the bag', async () => {
    const { field, sync } = await phoneWithBeat()
    await field.keepDraft(BUILDING_ID, { notes: { text: 'a' }, condition: { condition: 'good' } })
    await field.putInBag(BUILDING_ID)
    await field.keepDraft(BUILDING_ID, { notes: { text: 'b' }, condition: { condition: 'good' } })
    await field.putInBag(BUILDING_ID)

    const batch = await sync.nextBatch(10, 1e6)

    expect(batch.map(({ seq }) => seq)).toEqual([1, 2])
    expect(batch[1]?.mutation).toMatchObject({ set: { notes: { text: 'b' } } })
    expect(JSON.stringify(batch[1]?.mutation)).not.toContain('condition')
  })

  it('numbers the bag without gaps, photos and sheets together', async () => {
    const { field, sync, nextId } = await phoneWithBeat()
    const photoId = nextId()
    const photo = { photoId, sheetId: BUILDING_ID, sha256: 'a'.repeat(64), bytes: 3, mime: 'image/jpeg' as const }
    await field.addPhoto({ ...photo, widthPx: 4, heightPx: 3, tag: 'rear', takenAt: null }, new Uint8Array([1, 2, 3]))
    await field.keepDraft(BUILDING_ID, { notes: { text: 'a' } })
    await field.putInBag(BUILDING_ID)
    await field.removePhoto(photoId)

    expect((await sync.nextBatch(10, 1e6)).map(({ seq }) => seq)).toEqual([1, 2, 3])
    expect(await field.listPhotos(BUILDING_ID)).toEqual([])
    expect(await field.readPhotoBytes(photo.sha256)).toEqual(new Uint8Array([1, 2, 3]))
  })

  it('hides a confirmed photo as soon as it is removed, and shows it again when that is refused', async () => {
    const { field, sync, nextId } = await phoneWithBeat()
    const photoId = nextId()
    const meta = { photoId, sheetId: BUILDING_ID, sha256: 'a'.repeat(64), bytes: 3, mime: 'image/jpeg' as const }
    const fields = { ...meta, widthPx: 4, heightPx: 3, tag: 'rear' as const, takenAt: null, refusal: null }
    const change = { type: 'photo' as const, id: photoId, change: 5, fields: { ...fields, state: 'stored' as const } }
    await sync.applyPage({ cursor: '5', beatIds: [BEAT_ID], isLast: true, changes: [change] })

    await field.removePhoto(photoId)
    await field.removePhoto(photoId)

    expect(await field.listPhotos(BUILDING_ID)).toEqual([])
    expect((await field.readBuilding(BUILDING_ID))?.photoCount).toBe(0)
    const [removal, ...more] = await sync.nextBatch(10, 1e6)
    expect(more).toEqual([])
    expect(removal?.mutation).toMatchObject({ op: 'delete', entity: photoId, seen: 5 })

    await sync.settle([{ id: removal?.mutationId ?? '', seq: 1, status: 'blocked' }])
    expect((await field.listPhotos(BUILDING_ID)).map(({ place }) => place)).toEqual(['confirmed'])
  })

  it('leaves the draft untouched when the transaction fails', async () => {
    const { field, driver } = await phoneWithBeat()
    await field.keepDraft(BUILDING_ID, { notes: { text: 'a' } })
    await driver.run("CREATE TRIGGER full BEFORE INSERT ON outbox BEGIN SELECT RAISE(ABORT, 'disk full'); END")

    await expect(field.putInBag(BUILDING_ID)).rejects.toThrow('disk full')

    expect((await field.readSheet(BUILDING_ID))?.draft.notes?.text).toBe('a')
    expect((await field.readBag()).sheetCount).toBe(0)
  })

  it('L2 takes a page that comes twice once, and never an older row', async () => {
    const { field, sync } = await phoneWithBeat()
    const older = { ...buildBeat(), name: 'older' }

    await sync.applyPage({
      cursor: '2',
      beatIds: [BEAT_ID],
      isLast: true,
      changes: [{ type: 'beat', id: BEAT_ID, change: 1, fields: older }],
    })

    expect((await field.listBeats())[0]?.beat.name).toBe('Beat 4')
    expect((await sync.baseDigest()).count).toBe(2)
  })

  it('L8 drops what is gone and keeps the number of a gone sheet', async () => {
    const { field, sync, driver } = await phoneWithBeat()

    await sync.applyPage({
      cursor: '9',
      beatIds: [BEAT_ID],
      isLast: true,
      changes: [{ type: 'gone', id: BUILDING_ID, change: 9, of: 'sheet' }],
    })
    await field.keepDraft(BUILDING_ID, { notes: { text: 'new' } })

    expect(await driver.all('SELECT seen FROM draft')).toEqual([{ seen: 9 }])
  })

  it('saves a copy with every word that is not confirmed', async () => {
    const { field } = await phoneWithBeat()
    await field.keepDraft(BUILDING_ID, { notes: { text: 'in the bag' } })
    await field.putInBag(BUILDING_ID)
    await field.keepDraft(BUILDING_ID, { notes: { text: 'only a draft' } })

    const { json, fileName } = await field.exportBag()

    expect(json).toContain('in the bag')
    expect(json).toContain('only a draft')
    expect(fileName).toBe('bag-2026-10-13T1408.json')
  })
})

describe('where to look next', () => {
  it('is empty until the server has told, and is kept on the device', async () => {
    const { field, sync } = await phoneWithBeat()
    expect(await field.readNextLooks()).toEqual([])

    const list = {
      roundId: BUILDING_ID,
      figure: { material: 'timber', byYear: 2040 },
      runNumber: 3,
      rankedAt: '2026-11-30T12:00:00.000Z',
      roundCount: 9,
      looks: [
        {
          buildingId: BUILDING_ID,
          rank: 2,
          settleShare: 0.1,
          reason: { narrows: 'structure', isLarge: true },
          isRecorded: false,
        },
      ],
    } as const
    await sync.keepNextLooks([{ ...list, looks: [...list.looks] }])

    expect(await field.readNextLooks()).toEqual([list])
  })
})
