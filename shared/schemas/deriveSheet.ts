import type { StructureOrUnknown, UseOrUnknown } from '@/shared/compute/factors/vocabulary'
import type { SheetAnswers } from './sheet'
import { sheetFloorArea, type SheetFloorArea } from './sheetFloorArea'

/** What follows from the answers of a sheet, for totals and for the estimate on the phone. */
export interface DerivedSheet {
  readonly finding: 'standing' | 'inaccessible' | 'not-a-building' | 'cleared'
  /** Use, structure and years of the main part. */
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly yearFrom: number | null
  readonly yearTo: number | null
  readonly footprintM2: number | null
  /** With all parts; null where the footprint is not answered, or nothing stands. */
  readonly grossFloorAreaM2: number | null
  readonly floorAreaCv: number | null
}

/**
 * Use, structure, years and gross floor area that follow from a sheet's answers; "not known" stays unknown.
 *
 * @example
 * deriveSheet({ finding: { kind: 'standing' }, footprint: { footprintM2: 612, knownBy: 'register' }, storeys: { aboveGround: 3, knownBy: 'seen' } }).grossFloorAreaM2 // => 1836
 */
export function deriveSheet(answers: SheetAnswers): DerivedSheet {
  const finding = answers.finding?.kind ?? 'standing'
  const area = finding === 'standing' ? sheetFloorArea(answers) : null
  return {
    finding,
    use: answers.use?.use ?? 'unknown',
    structure: answers.structure?.structure ?? 'unknown',
    ...yearsOf(answers.constructionYear),
    footprintM2: answers.footprint?.footprintM2 ?? null,
    ...totalOf(area),
  }
}

function yearsOf(year: SheetAnswers['constructionYear']): Pick<DerivedSheet, 'yearFrom' | 'yearTo'> {
  if (year?.kind === 'exact') return { yearFrom: year.year, yearTo: year.year }
  if (year?.kind === 'between') return { yearFrom: year.fromYear, yearTo: year.toYear }
  return { yearFrom: null, yearTo: null }
}

function totalOf(area: SheetFloorArea | null): Pick<DerivedSheet, 'grossFloorAreaM2' | 'floorAreaCv'> {
  if (!area) return { grossFloorAreaM2: null, floorAreaCv: null }
  const grossFloorAreaM2 = area.partsM2.reduce((sum, areaM2) => sum + areaM2, area.mainM2)
  return { grossFloorAreaM2, floorAreaCv: area.floorAreaCv }
}
