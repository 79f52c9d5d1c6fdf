import type { Beat, Coverage, Round } from '@/shared/api/rounds'

/** Counts of buildings by the state of their sheet, for a SELECT that calls the state `state`. */
export const COVERAGE_COLUMNS = `count(*)::integer AS building_count,
  (count(*) FILTER (WHERE state IS NULL))::integer AS to_do_count,
  (count(*) FILTER (WHERE state = 'handed-in'))::integer AS handed_in_count,
  (count(*) FILTER (WHERE state = 'checked'))::integer AS checked_count,
  (count(*) FILTER (WHERE state = 'sent-back'))::integer AS sent_back_count`

export interface CoverageRow {
  building_count: number | null
  to_do_count: number | null
  handed_in_count: number | null
  checked_count: number | null
  sent_back_count: number | null
}

export interface RoundRow extends CoverageRow {
  round_id: string
  name: string
  district_id: string
  district_name: string
  starts_on: string
  ends_on: string
  footprint_m2: number | null
  recorded_footprint_m2: number | null
}

export interface BeatRow extends CoverageRow {
  beat_id: string
  name: string
  surveyor_id: string | null
  surveyor_name: string | null
}

export function presentRound(row: RoundRow): Round {
  const footprintM2 = row.footprint_m2 ?? 0
  return {
    roundId: row.round_id,
    name: row.name,
    districtId: row.district_id,
    districtName: row.district_name,
    startsOn: row.starts_on,
    endsOn: row.ends_on,
    coverage: presentCoverage(row),
    footprintShareRecorded: footprintM2 > 0 ? (row.recorded_footprint_m2 ?? 0) / footprintM2 : 0,
  } satisfies Round
}

export function presentBeat(row: BeatRow): Beat {
  return {
    beatId: row.beat_id,
    name: row.name,
    surveyorId: row.surveyor_id,
    surveyorName: row.surveyor_name,
    coverage: presentCoverage(row),
  } satisfies Beat
}

function presentCoverage(row: CoverageRow): Coverage {
  return {
    buildingCount: row.building_count ?? 0,
    toDoCount: row.to_do_count ?? 0,
    handedInCount: row.handed_in_count ?? 0,
    checkedCount: row.checked_count ?? 0,
    sentBackCount: row.sent_back_count ?? 0,
  } satisfies Coverage
}
