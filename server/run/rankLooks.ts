import { defaultAreaCv } from '@/shared/compute/area/defaultAreaCv'
import { UNKNOWN } from '@/shared/compute/factors/vocabulary'
import { floorAreaPrior, type FloorAreaPrior, type UnrecordedOutline } from '@/shared/compute/nextLook/floorAreaPrior'
import { nextLook, type FrameBuilding, type NextLooks } from '@/shared/compute/nextLook/nextLook'
import type { LookFigure, Sighting } from '@/shared/compute/nextLook/nextLook.types'
import type { EditionRows } from '@/shared/schemas/factorBook'
import type { Scenario } from '@/shared/schemas/run'
import { hazardMultiplierOf } from './hazardMultiplierOf'
import { lifetimesOf } from './lifetimesOf'
import type { LookRow, RecordedRow } from './lookFrame.types'
import type { RunSheet } from './runInputs.types'

export interface LookBasis {
  readonly rows: readonly LookRow[]
  /** Sheets of the run the ranking rests on, where they are of another round: the district is the same. */
  readonly earlierSheets: readonly RunSheet[]
  readonly edition: Pick<EditionRows, 'intensities' | 'lifetimes'>
  readonly scenario: Scenario
  readonly surveyYear: number
}

/** A frame as it stands now, ranked for one figure. What is cleared or no building is not in it. */
export function rankLooks(
  { rows, earlierSheets, edition, scenario, surveyYear }: LookBasis,
  figure: LookFigure,
): NextLooks {
  const standing = rows.filter(({ finding }) => finding !== 'cleared' && finding !== 'not-a-building')
  const recorded = standing.filter(isRecorded)
  const prior = floorAreaPrior(recorded)
  return nextLook({
    figure,
    buildings: standing.map((row) => frameBuilding(row, { prior, scenario, surveyYear })),
    sightings: sightingsOf([...recorded, ...earlierSheets], surveyYear),
    book: { intensities: edition.intensities, lifetimes: lifetimesOf(edition.lifetimes, scenario) },
    conventions: { surveyYear, yearOffset: scenario.yearOffset },
  })
}

/** Whether a sheet says what stands there. */
export function isRecorded(row: LookRow): row is RecordedRow {
  return row.state !== null && row.finding === 'standing' && (row.grossFloorAreaM2 ?? 0) > 0
}

interface Means {
  readonly prior: (outline: UnrecordedOutline) => FloorAreaPrior
  readonly scenario: Scenario
  readonly surveyYear: number
}

function frameBuilding(row: LookRow, { prior, scenario, surveyYear }: Means): FrameBuilding {
  const counted = defaultAreaCv('map-and-storeys')
  const hazardMultiplier = hazardMultiplierOf(row, scenario)
  if (isRecorded(row)) {
    const { buildingId, use, structure, grossFloorAreaM2: floorAreaM2, floorAreaCv } = row
    const known = { use, structure, ...yearsUntil(surveyYear, row.yearFrom, row.yearTo) }
    const floorAreaCvAfter = Math.min(floorAreaCv, counted)
    return { buildingId, known, hazardMultiplier, floorAreaM2, floorAreaCv, floorAreaCvAfter }
  }
  const { buildingId, registerYear, registerUse: use, registerStoreys, outlineFootprintM2: footprintM2 } = row
  return {
    buildingId,
    known: { use, structure: null, ...yearsUntil(surveyYear, registerYear, registerYear) },
    hazardMultiplier,
    ...prior({ use, footprintM2, registerStoreys: (registerStoreys ?? 0) > 0 ? registerStoreys : null }),
    floorAreaCvAfter: counted,
  }
}

/** A year after the survey is a fault of a register or a sheet: taken as not known here, refused by a run. */
function yearsUntil(surveyYear: number, from: number | null, to: number | null) {
  const isUsable = from !== null && to !== null && to <= surveyYear
  return isUsable ? { yearFrom: from, yearTo: to } : { yearFrom: null, yearTo: null }
}

function sightingsOf(
  recorded: readonly Pick<RunSheet, 'use' | 'structure' | 'yearFrom' | 'yearTo'>[],
  surveyYear: number,
): Sighting[] {
  const counts = new Map<string, { -readonly [Key in keyof Sighting]: Sighting[Key] }>()
  for (const { use, structure, yearFrom, yearTo } of recorded) {
    if (use === UNKNOWN || structure === UNKNOWN || yearFrom === null || yearTo === null || yearTo > surveyYear)
      continue
    const constructionYear = Math.round((yearFrom + yearTo) / 2)
    const key = `${use}|${structure}|${constructionYear}`
    const same = counts.get(key)
    if (same) same.count += 1
    else counts.set(key, { use, structure, constructionYear, count: 1 })
  }
  return [...counts.values()]
}
