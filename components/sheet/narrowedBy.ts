import { defaultAreaCv } from '@/shared/compute/area/defaultAreaCv'
import type { ArchetypeAttribute } from '@/shared/compute/factors/intensity.types'
import { POOLING_CV } from '@/shared/compute/factors/sharedCvDefaults'
import { deriveSheet } from '@/shared/schemas/deriveSheet'
import type { SheetAnswers } from '@/shared/schemas/sheet'

export type NarrowingAnswer = 'structure' | 'use' | 'constructionYear' | 'storeys'

/** A mass, and the attributes over whose values its factor had to be pooled. */
export interface PooledMass {
  readonly massKg: number
  readonly pooledOver: readonly ArchetypeAttribute[]
}

/**
 * The missing answer that would narrow a building's mass most: of use, structure and age the doubt is the spread over the
 * values pooled, by mass; of storeys it is what the floor area's error would fall by if somebody counted them. Null when
 * none is missing that makes a difference.
 */
export function narrowedBy(answers: SheetAnswers, pooled: readonly PooledMass[]): NarrowingAnswer | null {
  const wholeKg = pooled.reduce((sum, { massKg }) => sum + massKg, 0)
  const pooledShare = (attribute: ArchetypeAttribute) =>
    pooled.reduce((sum, { massKg, pooledOver }) => sum + (pooledOver.includes(attribute) ? massKg : 0), 0) / wholeKg
  const { use, structure, yearFrom } = deriveSheet(answers)
  const doubts: readonly (readonly [NarrowingAnswer, number])[] = [
    ['structure', structure === 'unknown' ? POOLING_CV.structure * pooledShare('structure') : 0],
    ['use', use === 'unknown' ? POOLING_CV.use * pooledShare('use') : 0],
    ['constructionYear', yearFrom === null ? POOLING_CV.period * pooledShare('period') : 0],
    ['storeys', storeysDoubt(answers)],
  ]
  const [most] = [...doubts].sort(([, a], [, b]) => b - a)
  return most && most[1] > 0 ? most[0] : null
}

function storeysDoubt({ storeys }: SheetAnswers): number {
  const counted = defaultAreaCv('map-and-storeys')
  if (!storeys || storeys.aboveGround === null) return Math.sqrt(defaultAreaCv('imputed') ** 2 - counted ** 2)
  const isByEye = storeys.knownBy === undefined || storeys.knownBy === 'guessed' || storeys.knownBy === 'told'
  return isByEye ? Math.sqrt(defaultAreaCv('by-eye') ** 2 - counted ** 2) : 0
}
