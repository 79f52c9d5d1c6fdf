import { describe, expect, it } from 'vitest'
import { buildBeat, buildBuilding, buildSheet } from '@/tests/support/buildFieldEntities'
import { BEAT_ID, BUILDING_ID } from '@/tests/support/forgetfulServer'
import { memoryPhone } from '@/tests/support/memoryPhone'

const CONFLICT_ID = '01980000-0000-7000-8000-0000000000c9'
const PHOTO_ID = '01980000-0000-7000-8000-0000000000b9'
const photo = {
  photoId: PHOTO_ID,
  sheetId: BUILDING_ID,
  sha256: 'a'.repeat(64),
  bytes: 3,
  mime: 'image/jpeg' as const,
  widthPx: 4,
  heightPx: 3,
  tag: 'street-front' as const,
  takenAt: '2026-10-13T14:00:00Z',
}

async function phoneWithConflict() {
  const phone = await memoryPhone()
  await phone.sync.applyPage({
    cursor: '4',
    beatIds: [BEAT_ID],
    isLast: true,
    changes: [
      { type: 'beat', id: BEAT_ID, change: 1, fields: buildBeat() },
      { type: 'building', id: BUILDING_ID, change: 2, fields: buildBuilding(BEAT_ID) },
      { type: 'sheet', id: BUILDING_ID, change: 3, fields: buildSheet(BEAT_ID, {}) },
      {
        type: 'conflict',
        id: CONFLICT_ID,
        change: 4,
        fields: {
          sheetId: BUILDING_ID,
          group: 'storeys',
          kept: { aboveGround: 3, knownBy: 'seen' },
          setAside: { aboveGround: 4, knownBy: 'said' },
          keptByName: 'Ann',
          setAsideByName: 'Ben',
          state: 'open',
        },
      },
    ],
  })
  return phone
}

describe('conflicts on a phone', () => {
  it('G8 are shown until a choice is in the bag, with the number that was on the screen, and one choice each', async () => {
    const { field, sync } = await phoneWithConflict()
    expect(await field.listConflicts()).toMatchObject([{ conflictId: CONFLICT_ID, label: 'Sailmaker Yard 3' }])

    await field.settleConflict(CONFLICT_ID, 'set-aside')
    await field.settleConflict(CONFLICT_ID, 'kept')

    expect(await field.listConflicts()).toEqual([])
    const batch = await sync.nextBatch(10, 1e6)
    expect(batch.map(({ mutation }) => mutation)).toMatchObject([
      { op: 'resolve', type: 'conflict', entity: CONFLICT_ID, seen: 4, set: { choice: 'set-aside' } },
    ])
  })
})

describe('space for photos', () => {
  it('F13 is kept for sheets when hardly any is left', async () => {
    const { field, room } = await phoneWithConflict()
    room.level = 'full'

    await expect(field.addPhoto(photo, new Uint8Array(3))).rejects.toThrow('kept for sheets')
    expect(await field.listPhotos(BUILDING_ID)).toEqual([])
  })

  it('comes back from photos the server has stored, when it runs short, and from no others', async () => {
    const { field, sync, room, bytes } = await phoneWithConflict()
    await field.addPhoto(photo, new Uint8Array(3))
    room.level = 'tight'
    expect([await sync.evictPhotos(), bytes.size]).toEqual([0, 1])

    const stored = { ...photo, state: 'stored' as const, refusal: null }
    const changes = [{ type: 'photo' as const, id: PHOTO_ID, change: 5, fields: stored }]
    await sync.applyPage({ cursor: '5', beatIds: [BEAT_ID], isLast: true, changes })
    room.level = 'roomy'
    expect([await sync.evictPhotos(), bytes.size]).toEqual([0, 1])
    room.level = 'tight'
    expect([await sync.evictPhotos(), bytes.size]).toEqual([1, 0])
  })
})
