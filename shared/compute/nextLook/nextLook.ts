import { districtDoubt, type DistrictDoubt } from './districtDoubt'
import { expectedFall, meanContribution } from './expectedFall'
import { kindFigures, type KindBook, type KindConventions } from './kindFigures'
import {
  LOOK_ATTRIBUTES,
  type DoubtfulBuilding,
  type ExpectedFall,
  type KnownKind,
  type LookAttribute,
  type LookFigure,
  type Sighting,
} from './nextLook.types'
import { possibleKinds } from './possibleKinds'

/** A building of the frame as it is known today, recorded or not. */
export interface FrameBuilding {
  readonly buildingId: string
  readonly known: KnownKind
  readonly hazardMultiplier: number
  readonly floorAreaM2: number
  readonly floorAreaCv: number
  readonly floorAreaCvAfter: number
}

/** Why to look: data that a screen puts in words. */
export interface LookReason {
  /** The attribute whose answer alone narrows the figure most. */
  readonly narrows: LookAttribute
  /** Of the largest quarter of the frame by floor area. */
  readonly isLarge: boolean
}

export interface Look extends ExpectedFall {
  readonly buildingId: string
  readonly floorAreaM2: number
  /** Expected contribution to the figure [kg]. */
  readonly meanKg: number
  /** Of the whole variance of the figure [–]. */
  readonly fallShare: number
  readonly reason: LookReason
}

export interface NextLooks {
  readonly doubt: DistrictDoubt
  readonly varianceKg2: number
  /** Buildings a look at which would tell something, the most telling first. */
  readonly looks: readonly Look[]
}

export interface LookOrder {
  readonly figure: LookFigure
  readonly buildings: readonly FrameBuilding[]
  readonly sightings: readonly Sighting[]
  readonly book: KindBook
  readonly conventions: KindConventions
}

const LARGEST_SHARE = 0.25
/** Less than this share of the whole variance is rounding. */
const LEAST_FALL_SHARE = 1e-9

/**
 * Ranks the buildings of a frame by how much a figure of the district would be surer if they were looked at:
 * {@link expectedFall} over the kinds each may be, against {@link districtDoubt} of all. Falls of independent buildings
 * add up, so the first n of the list are the best n.
 *
 * @returns the doubt now and the looks in falling order; equal falls in the order of the ids
 * @throws {ComputeError} `negative-area`, `factor-missing`, `negative-age` for a year after the survey
 * @see `expectedFall` for the derivation.
 * @example
 * nextLook({ figure: { material: 'all', byYear: null }, buildings: [], sightings: [], book: { intensities: [], lifetimes: [] }, conventions: { surveyYear: 2026, yearOffset: 0.5 } }).looks // => []
 */
export function nextLook({ figure, buildings, sightings, book, conventions }: LookOrder): NextLooks {
  const doubtful = doubtfulBuildings({ figure, buildings, sightings, book, conventions })
  const doubt = districtDoubt(doubtful)
  const { measurement, factor, lifetime, chance } = doubt.varianceByCauseKg2
  const varianceKg2 = measurement + factor + lifetime + chance
  const largeM2 = leastOfLargest(buildings.map(({ floorAreaM2 }) => floorAreaM2))
  const looks = doubtful
    .map((building): Look => {
      const fall = expectedFall(building)
      return {
        ...fall,
        buildingId: building.buildingId,
        floorAreaM2: building.floorAreaM2,
        meanKg: building.floorAreaM2 * meanContribution(building.kinds),
        fallShare: varianceKg2 > 0 ? fall.wholeKg2 / varianceKg2 : 0,
        reason: { narrows: mostTelling(fall), isLarge: building.floorAreaM2 >= largeM2 },
      }
    })
    .filter(({ fallShare }) => fallShare > LEAST_FALL_SHARE)
    .sort((a, b) => b.wholeKg2 - a.wholeKg2 || (a.buildingId < b.buildingId ? -1 : 1))
  return { doubt, varianceKg2, looks }
}

/**
 * The buildings of a frame with the kinds they may be and the figures of each.
 *
 * @throws {ComputeError} `factor-missing`, `negative-age` for a year after the survey
 * @see `possibleKinds`, `kindFigures`.
 * @example
 * doubtfulBuildings({ figure: { material: 'all', byYear: null }, buildings: [], sightings: [], book: { intensities: [], lifetimes: [] }, conventions: { surveyYear: 2026, yearOffset: 0.5 } }) // => []
 */
export function doubtfulBuildings(order: LookOrder): DoubtfulBuilding[] {
  const { figure, buildings, sightings, book, conventions } = order
  const { surveyYear } = conventions
  const figuresOf = kindFigures(figure, book, conventions, oldestYearOf(order))
  const keptKinds = new Map<string, DoubtfulBuilding['kinds']>()
  return buildings.map(({ known, hazardMultiplier, ...building }) => {
    const key = `${known.use}|${known.structure}|${known.yearFrom}|${known.yearTo}|${hazardMultiplier}`
    let kinds = keptKinds.get(key)
    if (!kinds) {
      kinds = possibleKinds(known, sightings, surveyYear).map((kind) => ({
        ...kind,
        figure: figuresOf(kind, hazardMultiplier),
      }))
      keptKinds.set(key, kinds)
    }
    return { ...building, kinds }
  })
}

/** Open ends reach back as far as a run takes them. */
function oldestYearOf({ buildings, sightings, conventions: { surveyYear } }: LookOrder): number {
  let oldest = surveyYear - 120
  for (const { constructionYear } of sightings) oldest = Math.min(oldest, constructionYear)
  for (const { known } of buildings) if (known.yearFrom !== null) oldest = Math.min(oldest, known.yearFrom)
  return oldest
}

function mostTelling({ byAttributeKg2 }: ExpectedFall): LookAttribute {
  let most: LookAttribute = 'floorArea'
  for (const attribute of LOOK_ATTRIBUTES) if (byAttributeKg2[attribute] > byAttributeKg2[most]) most = attribute
  return most
}

function leastOfLargest(floorAreasM2: readonly number[]): number {
  const falling = [...floorAreasM2].sort((a, b) => b - a)
  return falling[Math.max(0, Math.ceil(falling.length * LARGEST_SHARE) - 1)] ?? Infinity
}
