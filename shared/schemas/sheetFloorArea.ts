import { defaultAreaCv } from '@/shared/compute/area/defaultAreaCv'
import { grossFloorArea } from '@/shared/compute/area/grossFloorArea'
import type { AreaMethod } from '@/shared/compute/area/areaMethods'
import type { KnownBy, SheetAnswers } from './sheet'

/** Gross floor areas of the main part and of the others, in the order of the sheet. */
export interface SheetFloorArea {
  readonly mainM2: number
  readonly partsM2: readonly number[]
  /** Of all of it together. */
  readonly floorAreaCv: number
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
 * Gross floor area of a standing building by its parts. The footprint is that of the whole; what the parts leave of it
 * is the main part's, and attic and basement are the main part's too. Errors of parts are taken as independent.
 *
 * @returns null while the footprint is not answered
 * @example
 * sheetFloorArea({ footprint: { footprintM2: 100, knownBy: 'measured' }, storeys: { aboveGround: 2, knownBy: 'measured' } }) // => { mainM2: 200, partsM2: [], floorAreaCv: 0.02 }
 */
export function sheetFloorArea(answers: SheetAnswers): SheetFloorArea | null {
  const main = mainPart(answers)
  if (!main) return null
  const known = answers.parts?.knownBy
  const others = (answers.parts?.parts ?? []).map(({ footprintM2, aboveGround }) => ({
    areaM2: footprintM2 * (aboveGround ?? STOREYS_IF_UNKNOWN),
    cv: aboveGround === null ? defaultAreaCv('imputed') : cvOf(known),
  }))
  const partsM2 = others.map(({ areaM2 }) => areaM2)
  if (others.length === 0) return { mainM2: main.areaM2, partsM2, floorAreaCv: main.cv }
  const wholeM2 = partsM2.reduce((sum, areaM2) => sum + areaM2, main.areaM2)
  const errorM2 = Math.hypot(...[main, ...others].map(({ areaM2, cv }) => areaM2 * cv))
  return { mainM2: main.areaM2, partsM2, floorAreaCv: errorM2 / wholeM2 }
}

function mainPart({ storeys, attic, basement, footprint, parts }: SheetAnswers): { areaM2: number; cv: number } | null {
  if (!footprint) return null
  const counted = storeys?.aboveGround ?? null
  const areaM2 = grossFloorArea({
    footprintM2: Math.max(0, footprint.footprintM2 - takenByParts(parts)),
    storeys: counted ?? STOREYS_IF_UNKNOWN,
    ...optionalShare('atticShare', attic?.floorShare),
    ...optionalShare('basementShare', basement?.floorShare),
  })
  return { areaM2, cv: counted === null ? defaultAreaCv('imputed') : worseCv(footprint.knownBy, storeys?.knownBy) }
}

function takenByParts(parts: SheetAnswers['parts']): number {
  return (parts?.parts ?? []).reduce((sum, { footprintM2 }) => sum + footprintM2, 0)
}

function worseCv(one: KnownBy | undefined, other: KnownBy | undefined): number {
  return Math.max(cvOf(one), cvOf(other))
}

function optionalShare<Key extends string>(key: Key, share: number | null | undefined): { [name in Key]?: number } {
  return share === null || share === undefined ? {} : ({ [key]: share } as { [name in Key]?: number })
}

function cvOf(known: KnownBy | undefined): number {
  return defaultAreaCv(METHOD_OF[known ?? 'guessed'])
}
