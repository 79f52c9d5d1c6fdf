import { defaultAreaCv } from '@/shared/compute/area/defaultAreaCv'
import { grossFloorArea } from '@/shared/compute/area/grossFloorArea'
import type { AreaMethod } from '@/shared/compute/area/areaMethods'
import type { StructureOrUnknown, UseOrUnknown } from '@/shared/compute/factors/vocabulary'
import type { KnownBy, SheetAnswers } from './sheet'

/** What follows from the answers of a sheet, for totals and for the estimate on the phone. */
export interface DerivedSheet {
  readonly finding: 'standing' | 'inaccessible' | 'not-a-building' | 'cleared'
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly yearFrom: number | null
  readonly yearTo: number | null
  readonly footprintM2: number | null
  /** Null where the footprint is not answered, or nothing stands. */
  readonly grossFloorAreaM2: number | null
  readonly floorAreaCv: number | null
}

/** Storeys taken where they are not known, and the error that goes with it: common practice. */
export const STOREYS_IF_UNKNOWN = 2

const METHOD_OF: Readonly<Record<KnownBy, AreaMethod>> = {
  measured: 'plans',
  register: 'map-and-storeys',
  seen: 'map-and-storeys',
  told: 'by-eye',
  guessed: 'by-eye',
}

/**
 * Use, structure, years and gross floor area that follow from a sheet's answers; "not known" stays unknown.
 *
 * @example
 * deriveSheet({ finding: { kind: 'standing' }, footprint: { footprintM2: 612, knownBy: 'register' }, storeys: { aboveGround: 3, knownBy: 'seen' } }).grossFloorAreaM2 // => 1836
 */
export function deriveSheet(answers: SheetAnswers): DerivedSheet {
  const finding = answers.finding?.kind ?? 'standing'
  const footprintM2 = answers.footprint?.footprintM2 ?? null
  const year = answers.constructionYear
  return {
    finding,
    use: answers.use?.use ?? 'unknown',
    structure: answers.structure?.structure ?? 'unknown',
    yearFrom: year?.kind === 'exact' ? year.year : year?.kind === 'between' ? year.fromYear : null,
    yearTo: year?.kind === 'exact' ? year.year : year?.kind === 'between' ? year.toYear : null,
    footprintM2,
    ...floorAreaOf(answers, finding === 'standing' ? footprintM2 : null),
  }
}

function floorAreaOf(
  answers: SheetAnswers,
  footprintM2: number | null,
): Pick<DerivedSheet, 'grossFloorAreaM2' | 'floorAreaCv'> {
  if (footprintM2 === null) return { grossFloorAreaM2: null, floorAreaCv: null }
  const storeys = answers.storeys?.aboveGround ?? null
  const grossFloorAreaM2 = grossFloorArea({
    footprintM2,
    storeys: storeys ?? STOREYS_IF_UNKNOWN,
    atticShare: answers.attic?.floorShare ?? 0,
    basementShare: answers.basement?.floorShare ?? 0,
  })
  if (storeys === null) return { grossFloorAreaM2, floorAreaCv: defaultAreaCv('imputed') }
  const methods = [answers.footprint?.knownBy, answers.storeys?.knownBy].map((known) => METHOD_OF[known ?? 'guessed'])
  return { grossFloorAreaM2, floorAreaCv: Math.max(...methods.map(defaultAreaCv)) }
}
