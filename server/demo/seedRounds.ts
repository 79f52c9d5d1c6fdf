import { chance } from './draw'
import { demoRandom } from './demoRandom'
import { insertRows } from './insertRows'
import { ROUNDS, type RoundPlan } from './roundPlans'
import { demoId, type SeededBuilding, type Seeding } from './seeding.types'
import { seedPhotos, type PhotoPlace } from './seedPhotos'
import { sheetRow } from './sheetRow'
import { surveyBuilding } from './surveyBuilding'

const SURVEYORS = ['surveyor-2', 'surveyor-3', 'surveyor-4'] as const

type Row = Record<string, unknown>

/** Rounds with beats, frames, and sheets as invented surveyors would have handed them in. */
export async function seedRounds(seeding: Seeding, town: readonly SeededBuilding[]): Promise<void> {
  for (const plan of ROUNDS) {
    // what came down before a round began was never in its frame, but for what fell since the round before
    const frame = town.filter(
      ({ district, year, clearedYear }) =>
        district === plan.district && year < plan.year && (clearedYear === null || clearedYear > plan.year - 6),
    )
    await seedRound(seeding, plan, frame)
  }
}

async function seedRound(seeding: Seeding, plan: RoundPlan, frame: readonly SeededBuilding[]): Promise<void> {
  const { sequelize, transaction, organisationId } = seeding
  const insert = (table: string, rows: readonly Row[]) => insertRows(sequelize, transaction, table, rows)
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
  await insert('beat', beatRows(seeding, plan, roundId))
  const { buildings, sheets, photos } = recordFrame(seeding, plan, roundId, frame)
  await insert('round_building', buildings)
  await insert('sheet', sheets)
  await insert('sheet_revision', sheets.map(toRevision))
  await seedPhotos(seeding, photos)
}

function surveyorOf(plan: RoundPlan, beat: number): string {
  return demoId('person', beat === 3 && plan.key === 'ropewalk-2026' ? 'surveyor' : SURVEYORS[beat % SURVEYORS.length]!)
}

function beatRows(seeding: Seeding, plan: RoundPlan, roundId: string): Row[] {
  return Array.from({ length: plan.beatCount }, (_, beat) => ({
    organisation_id: seeding.organisationId,
    beat_id: demoId('beat', plan.key, beat),
    round_id: roundId,
    name: `Beat ${beat + 1}`,
    surveyor_id: surveyorOf(plan, beat),
    change_no: seeding.nextChange(),
  }))
}

function recordFrame(seeding: Seeding, plan: RoundPlan, roundId: string, frame: readonly SeededBuilding[]) {
  const size = Math.ceil(frame.length / plan.beatCount)
  const random = demoRandom(plan.key)
  const sheets: Row[] = []
  const photos: PhotoPlace[] = []
  const buildings = frame.map((building, index): Row => {
    const beat = Math.floor(index / size)
    const buildingId = demoId('building', plan.key, building.outlineId)
    const beatId = demoId('beat', plan.key, beat)
    const personId = surveyorOf(plan, beat)
    const state = plan.stateOf(beat, index % size, size, random.next())
    const answers = surveyBuilding(random, building, building.footprintM2, plan.year)
    if (state) {
      sheets.push(
        sheetRow(seeding, { plan, roundId, beatId, buildingId, building, answers, state, personId, day: index % size }),
      )
      const isInReview = plan.key === 'ropewalk-2026' && state !== 'checked' && answers.finding?.kind === 'standing'
      if (isInReview && chance(random, 0.85)) photos.push({ sheetId: buildingId, beatId, personId, building })
    }
    return {
      organisation_id: seeding.organisationId,
      building_id: buildingId,
      round_id: roundId,
      outline_id: building.outlineId,
      beat_id: beatId,
      change_no: seeding.nextChange(),
    }
  })
  return { buildings, sheets, photos }
}

function toRevision(sheet: Row): Row {
  return {
    organisation_id: sheet['organisation_id'],
    sheet_id: sheet['sheet_id'],
    revision: 1,
    state: sheet['state'],
    answers: sheet['answers'],
    by_person: sheet['recorded_by'],
    at: sheet['recorded_at'],
    change_no: sheet['change_no'],
  }
}
