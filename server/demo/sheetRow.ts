import { deriveSheet } from '@/shared/schemas/deriveSheet'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import type { RoundPlan, SheetState } from './roundPlans'
import { demoId, type SeededBuilding, type Seeding } from './seeding.types'

export interface SheetParts {
  readonly plan: RoundPlan
  readonly roundId: string
  readonly beatId: string
  readonly buildingId: string
  readonly building: SeededBuilding
  readonly answers: SheetAnswers
  readonly state: SheetState
  readonly personId: string
  readonly day: number
}

const QUESTIONS = [
  'Is the rear wing the same age?',
  'The register says four storeys. Is the top one set back?',
  'Which material carries the upper floors?',
] as const

/** A row of the table `sheet` as the planner's desk would have left it. */
export function sheetRow(
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
