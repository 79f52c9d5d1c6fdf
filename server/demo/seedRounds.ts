import { deriveSheet } from '@/shared/schemas/deriveSheet'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { chance } from './draw'
import { demoRandom } from './demoRandom'
import { insertRows } from './insertRows'
import { seedPhotos } from './seedPhotos'
import { demoId, type SeededBuilding, type Seeding } from './seedDemo'
import { surveyBuilding } from './surveyBuilding'
import type { DistrictName } from './townNames'

type State = 'handed-in' | 'checked' | 'sent-back'

interface RoundPlan {
  readonly key: string
  readonly name: string
  readonly district: DistrictName
  readonly startsOn: string
  readonly endsOn: string
  readonly year: number
  readonly beatCount: number
  /** State of the n-th of `count` buildings of a beat; null is to do. */
  readonly stateOf: (beat: number, place: number, count: number, draw: number) => State | null
}

const allChecked = () => 'checked' as const

/** Two past rounds to learn from, one finished this year, and one under way. */
export const ROUNDS: readonly RoundPlan[] = [
  {
    key: 'ropewalk-2016',
    name: 'Ropewalk, first round',
    district: 'Ropewalk',
    startsOn: '2016-04-04',
    endsOn: '2016-09-30',
    year: 2016,
    beatCount: 6,
    stateOf: allChecked,
  },
  {
    key: 'ropewalk-2021',
    name: 'Ropewalk, second round',
    district: 'Ropewalk',
    startsOn: '2021-04-06',
    endsOn: '2021-09-24',
    year: 2021,
    beatCount: 6,
    stateOf: allChecked,
  },
  {
    key: 'kiln-2026',
    name: 'Kiln Quarter, summer round',
    district: 'Kiln Quarter',
    startsOn: '2026-05-04',
    endsOn: '2026-08-28',
    year: 2026,
    beatCount: 5,
    stateOf: allChecked,
  },
  {
    key: 'ropewalk-2026',
    name: 'Ropewalk, autumn round',
    district: 'Ropewalk',
    startsOn: '2026-09-14',
    endsOn: '2026-12-18',
    year: 2026,
    beatCount: 7,
    stateOf: autumnState,
  },
]

/** Beats 1 to 3 are done, beat 4 is the demo surveyor's and a third done, the others are under way. */
function autumnState(beat: number, place: number, count: number, draw: number): State | null {
  const done = [1, 1, 0.92, 0.35, 0.6, 0.2, 0][beat] ?? 0
  if (place >= done * count) return null
  if (beat < 2) return 'checked'
  if (draw < 0.02) return 'sent-back'
  return draw < 0.7 ? 'checked' : 'handed-in'
}

const SURVEYORS = ['surveyor-2', 'surveyor-3', 'surveyor-4'] as const

/** Rounds with beats, frames, and sheets as invented surveyors would have handed them in. */
export async function seedRounds(seeding: Seeding, town: readonly SeededBuilding[]): Promise<void> {
  for (const plan of ROUNDS) {
    // what came down before a round began was never in its frame, but for what fell since the round before
    const frame = town.filter(
      ({ district, clearedYear }) =>
        district === plan.district && (clearedYear === null || clearedYear > plan.year - 6),
    )
    await seedRound(seeding, plan, frame)
  }
}

async function seedRound(seeding: Seeding, plan: RoundPlan, frame: readonly SeededBuilding[]): Promise<void> {
  const { sequelize, transaction, organisationId } = seeding
  const insert = (table: string, rows: readonly Readonly<Record<string, unknown>>[]) =>
    insertRows(sequelize, transaction, table, rows)
  const roundId = demoId('round', plan.key)
  await insert('round', [
    {
      organisation_id: organisationId,
      round_id: roundId,
      district_id: demoId('district', plan.district),
      name: plan.name,
      starts_on: plan.startsOn,
      ends_on: plan.endsOn,
      created_by: demoId('person', 'planner'),
      created_at: `${plan.startsOn}T07:30:00Z`,
    },
  ])

  const size = Math.ceil(frame.length / plan.beatCount)
  const surveyorOf = (beat: number) =>
    demoId('person', beat === 3 && plan.key === 'ropewalk-2026' ? 'surveyor' : SURVEYORS[beat % SURVEYORS.length]!)
  await insert(
    'beat',
    Array.from({ length: plan.beatCount }, (_, beat) => ({
      organisation_id: organisationId,
      beat_id: demoId('beat', plan.key, beat),
      round_id: roundId,
      name: `Beat ${beat + 1}`,
      surveyor_id: surveyorOf(beat),
      change_no: seeding.nextChange(),
    })),
  )

  const random = demoRandom(plan.key)
  const sheets: Record<string, unknown>[] = []
  const withPhotos: { sheetId: string; beatId: string; personId: string; building: SeededBuilding }[] = []
  const frameRows = frame.map((building, index) => {
    const beat = Math.floor(index / size)
    const buildingId = demoId('building', plan.key, building.outlineId)
    const beatId = demoId('beat', plan.key, beat)
    const state = plan.stateOf(beat, index % size, size, random.next())
    const answers = surveyBuilding(random, building, building.footprintM2, plan.year)
    if (state) {
      sheets.push(
        sheetRow(seeding, {
          plan,
          roundId,
          beatId,
          buildingId,
          building,
          answers,
          state,
          personId: surveyorOf(beat),
          day: index % size,
        }),
      )
      if (
        plan.key === 'ropewalk-2026' &&
        state !== 'checked' &&
        answers.finding?.kind === 'standing' &&
        chance(random, 0.85)
      ) {
        withPhotos.push({ sheetId: buildingId, beatId, personId: surveyorOf(beat), building })
      }
    }
    return {
      organisation_id: organisationId,
      building_id: buildingId,
      round_id: roundId,
      outline_id: building.outlineId,
      beat_id: beatId,
      change_no: seeding.nextChange(),
    }
  })
  await insert('round_building', frameRows)
  await insert('sheet', sheets)
  await insert(
    'sheet_revision',
    sheets.map((sheet) => ({
      organisation_id: organisationId,
      sheet_id: sheet['sheet_id'],
      revision: 1,
      state: sheet['state'],
      answers: sheet['answers'],
      by_person: sheet['recorded_by'],
      at: sheet['recorded_at'],
      change_no: sheet['change_no'],
    })),
  )
  await seedPhotos(seeding, withPhotos)
}

interface SheetParts {
  readonly plan: RoundPlan
  readonly roundId: string
  readonly beatId: string
  readonly buildingId: string
  readonly building: SeededBuilding
  readonly answers: SheetAnswers
  readonly state: State
  readonly personId: string
  readonly day: number
}

const QUESTIONS = [
  'Is the rear wing the same age?',
  'The register says four storeys. Is the top one set back?',
  'Which material carries the upper floors?',
] as const

function sheetRow(
  seeding: Seeding,
  { plan, roundId, beatId, buildingId, building, answers, state, personId, day }: SheetParts,
): Record<string, unknown> {
  const change = seeding.nextChange()
  const groups = Object.keys(answers)
  const derived = deriveSheet(answers)
  const recorded = new Date(`${plan.startsOn}T08:10:00Z`)
  recorded.setUTCDate(recorded.getUTCDate() + Math.floor(day / 14))
  recorded.setUTCMinutes((day % 14) * 27)
  const reviewed = state === 'handed-in' ? null : new Date(recorded.getTime() + 3 * 86_400_000)
  return {
    organisation_id: seeding.organisationId,
    sheet_id: buildingId,
    round_id: roundId,
    beat_id: beatId,
    outline_id: building.outlineId,
    answers,
    versions: Object.fromEntries(groups.map((group) => [group, change])),
    writers: Object.fromEntries(groups.map((group) => [group, demoId('device', personId)])),
    state,
    revision: 1,
    question: state === 'sent-back' ? QUESTIONS[change % QUESTIONS.length]! : null,
    reviewed_by: reviewed === null ? null : demoId('person', 'planner'),
    reviewed_at: reviewed?.toISOString() ?? null,
    recorded_by: personId,
    recorded_at: recorded.toISOString(),
    change_no: change,
    finding: derived.finding,
    use: derived.use,
    structure: derived.structure,
    year_from: derived.yearFrom,
    year_to: derived.yearTo,
    footprint_m2: derived.footprintM2,
    gross_floor_area_m2: derived.grossFloorAreaM2,
    floor_area_cv: derived.floorAreaCv,
  }
}
