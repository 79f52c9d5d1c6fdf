import { describe, expect, it } from 'vitest'
import { lookReasonText } from '@/components/nextLook/lookReasonText'
import { lookFigureText } from '@/components/nextLook/lookFigureText'
import type { StoredBuilding } from '@/db/fieldStore.types'
import { createMessages } from '@/shared/messages/createMessages'
import type { DeviceLook, DeviceLooks } from '@/shared/schemas/nextLook'
import { buildBuilding } from '@/tests/support/buildFieldEntities'
import { nextOnBeat } from './nextOnBeat'

const building = buildBuilding('0191c0de-0000-7000-8000-000000000001')
const stored = (buildingId: string, footprintM2: number, state: StoredBuilding['state'] = 'to-do'): StoredBuilding => ({
  buildingId,
  building: { ...building, outline: { ...building.outline, footprintM2 } },
  state,
  question: null,
  photoCount: 0,
  answers: {},
})
const look = (buildingId: string, rank: number, isRecorded = false): DeviceLook => ({
  buildingId,
  rank,
  settleShare: 0.1 / rank,
  reason: { narrows: 'structure', isLarge: false },
  isRecorded,
})
const listOf = (...looks: DeviceLook[]): DeviceLooks => ({
  roundId: building.roundId,
  figure: { material: 'timber', byYear: 2040 },
  runNumber: 3,
  rankedAt: '2026-11-30T12:00:00.000Z',
  roundCount: 40,
  looks,
})
const idsOf = (next: ReturnType<typeof nextOnBeat>) => next.map(({ stored: { buildingId } }) => buildingId)

describe('what to look at next of a beat', () => {
  it('follows the list of the round, begun ones first', () => {
    const buildings = [stored('big', 900), stored('telling', 100), stored('begun', 10, 'started')]

    expect(idsOf(nextOnBeat(buildings, listOf(look('telling', 2), look('big', 30))))).toEqual([
      'begun',
      'telling',
      'big',
    ])
  })

  it('names what is recorded and still in doubt, not what was recorded since or lies in the bag', () => {
    const buildings = [
      stored('doubtful', 5, 'checked'),
      stored('since', 5, 'handed-in'),
      stored('bag', 5, 'in-the-bag'),
    ]
    const list = listOf(look('doubtful', 1, true), look('since', 2), look('bag', 3, true))

    expect(idsOf(nextOnBeat(buildings, list))).toEqual(['doubtful'])
  })

  it('falls back on the largest unrecorded without a list', () => {
    expect(
      idsOf(nextOnBeat([stored('small', 10), stored('large', 500), stored('done', 900, 'checked')], null)),
    ).toEqual(['large', 'small'])
  })
})

describe('the words of a look', () => {
  const { t } = createMessages('en')

  it('say what is missing, whether it is large, and that it was recorded', () => {
    expect(lookReasonText({ narrows: 'constructionYear', isLarge: true }, false, t)).toBe('large, age not known')
    expect(lookReasonText({ narrows: 'floorArea', isLarge: false }, true, t)).toBe(
      'recorded, but floor area only estimated',
    )
  })

  it('name the figure', () => {
    expect(lookFigureText({ material: 'timber', byYear: 2040 }, t)).toMatch(/coming down by 2040/)
    expect(lookFigureText({ material: 'all', byYear: null }, t)).toBe('all materials standing today')
  })
})
