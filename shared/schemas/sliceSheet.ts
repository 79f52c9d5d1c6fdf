import type { StructureOrUnknown, UseOrUnknown } from '@/shared/compute/factors/vocabulary'
import { deriveSheet } from './deriveSheet'
import type { SheetAnswers } from './sheet'
import { sheetFloorArea } from './sheetFloorArea'

/** The floor area of one building that has one use, one structure and one age. */
export interface SheetSlice {
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly yearFrom: number | null
  readonly yearTo: number | null
  readonly grossFloorAreaM2: number
}

/**
 * A building cut into slices of one use, structure and age: the main part by its uses and their shares, then the other
 * parts. Their floor areas add up to the building's. A slice without area is left out.
 *
 * @returns none while the footprint is not answered or where nothing stands
 * @example
 * sliceSheet({ footprint: { footprintM2: 100, knownBy: 'measured' }, storeys: { aboveGround: 3, knownBy: 'seen' }, use: { use: 'multi-family', otherUses: [{ use: 'retail', share: 0.25 }] } }).map(({ use, grossFloorAreaM2 }) => [use, grossFloorAreaM2]) // => [['multi-family', 225], ['retail', 75]]
 */
export function sliceSheet(answers: SheetAnswers): SheetSlice[] {
  const { finding, use, structure, yearFrom, yearTo } = deriveSheet(answers)
  const area = finding === 'standing' ? sheetFloorArea(answers) : null
  if (!area) return []
  const main = { use, structure, yearFrom, yearTo }
  const others = answers.use?.otherUses ?? []
  const mainShare = others.reduce((share, other) => share - other.share, 1)
  const slices = [
    { ...main, grossFloorAreaM2: area.mainM2 * mainShare },
    ...others.map((other) => ({ ...main, use: other.use, grossFloorAreaM2: area.mainM2 * other.share })),
    ...(answers.parts?.parts ?? []).map((part, index) => {
      const { yearFrom: from, yearTo: to } = deriveSheet({ constructionYear: part.constructionYear })
      const of = { use: part.use ?? use, structure: part.structure, yearFrom: from, yearTo: to }
      return { ...of, grossFloorAreaM2: area.partsM2[index]! }
    }),
  ]
  return slices.filter(({ grossFloorAreaM2 }) => grossFloorAreaM2 > 0)
}
