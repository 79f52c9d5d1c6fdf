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
  return {
    finding,
    use: answers.use?.use ?? 'unknown',
    structure: answers.structure?.structure ?? 'unknown',
    ...yearsOf(answers.constructionYear),
    footprintM2,
    ...floorAreaOf(answers, finding === 'standing' ? footprintM2 : null),
  }
}

function yearsOf(year: SheetAnswers['constructionYear']): Pick<DerivedSheet, 'yearFrom' | 'yearTo'> {
  if (year?.kind === 'exact') return { yearFrom: year.year, yearTo: year.year }
  if (year?.kind === 'between') return { yearFrom: year.fromYear, yearTo: year.toYear }
  return { yearFrom: null, yearTo: null }
}

function floorAreaOf(
  { storeys, attic, basement, footprint }: SheetAnswers,
  footprintM2: number | null,
): Pick<DerivedSheet, 'grossFloorAreaM2' | 'floorAreaCv'> {
  if (footprintM2 === null) return { grossFloorAreaM2: null, floorAreaCv: null }
  const counted = storeys?.aboveGround ?? null
  const grossFloorAreaM2 = grossFloorArea({
    footprintM2,
    storeys: counted ?? STOREYS_IF_UNKNOWN,
    ...optionalShare('atticShare', attic?.floorShare),
    ...optionalShare('basementShare', basement?.floorShare),
  })
  if (counted === null) return { grossFloorAreaM2, floorAreaCv: defaultAreaCv('imputed') }
  return { grossFloorAreaM2, floorAreaCv: Math.max(cvOf(footprint?.knownBy), cvOf(storeys?.knownBy)) }
}

function optionalShare<Key extends string>(key: Key, share: number | null | undefined): { [name in Key]?: number } {
  return share === null || share === undefined ? {} : ({ [key]: share } as { [name in Key]?: number })
}

function cvOf(known: KnownBy | undefined): number {
  return defaultAreaCv(METHOD_OF[known ?? 'guessed'])
}
