import type { SheetAnswers } from '@/shared/schemas/sheet'
import type { BeatEntity, BuildingEntity, SheetEntity } from '@/shared/schemas/sync'

const ROUND_ID = '01980000-0000-7000-8000-0000000000f1'

export function buildBeat(): BeatEntity {
  return {
    name: 'Beat 4',
    roundId: ROUND_ID,
    roundName: 'Autumn round',
    districtName: 'Ropewalk',
    startsOn: '2026-10-01',
    endsOn: '2026-11-30',
    buildingCount: 1,
  }
}

export function buildBuilding(beatId: string): BuildingEntity {
  return {
    roundId: ROUND_ID,
    beatId,
    outline: {
      outlineId: '01980000-0000-7000-8000-0000000000c1',
      reference: 'R-0417',
      street: 'Sailmaker Yard',
      houseNumber: '3',
      footprintM2: 612,
      blockId: null,
      register: { year: 1905, storeys: 3, heightM: null, use: 'office' },
    },
    geometry: {
      type: 'Polygon',
      coordinates: [
        [
          [1, 51],
          [1.0003, 51],
          [1.0003, 51.0003],
          [1, 51],
        ],
      ],
    },
  }
}

export function buildSheet(beatId: string, answers: SheetAnswers): SheetEntity {
  return {
    roundId: ROUND_ID,
    beatId,
    answers,
    review: { state: 'handed-in', question: null, reviewedByName: null, reviewedAt: null },
    revision: 1,
    recordedByName: 'Ada Fenn',
    recordedAt: '2026-10-13T14:08:00Z',
  }
}
