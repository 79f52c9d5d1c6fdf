import { intensityFor } from '@/shared/compute/factors/intensityFor'
import type { ArchetypeAttribute } from '@/shared/compute/factors/intensity.types'
import { POOLING_CV } from '@/shared/compute/factors/sharedCvDefaults'
import { periodOfYear } from '@/shared/compute/factors/periodOfYear'
import { MATERIALS, type Material, type PeriodIdOrUnknown } from '@/shared/compute/factors/vocabulary'
import { lognormalFromMean } from '@/shared/compute/uncertainty/lognormalFromMean'
import { lognormalQuantile } from '@/shared/compute/uncertainty/lognormalQuantile'
import { productCv } from '@/shared/compute/uncertainty/productCv'
import { deriveSheet, type DerivedSheet } from '@/shared/schemas/deriveSheet'
import type { EditionForDevice } from '@/shared/schemas/factorBook'
import type { SheetAnswers } from '@/shared/schemas/sheet'

export interface SheetEstimate {
  readonly massKg: number
  readonly lowKg: number
  readonly highKg: number
  /** Heaviest first. */
  readonly parts: readonly { readonly material: Material; readonly massKg: number }[]
  /** The missing answer that would narrow it most; null when none is missing. */
  readonly narrowedBy: 'structure' | 'use' | 'constructionYear' | 'storeys' | null
}

/** Tonnes of one building from its answers as they stand, with P10 and P90; null while too little is answered. */
export function estimateSheet(answers: SheetAnswers, edition: EditionForDevice): SheetEstimate | null {
  const derived = deriveSheet(answers)
  const { grossFloorAreaM2, floorAreaCv } = derived
  if (grossFloorAreaM2 === null) return null
  const key = { use: derived.use, structure: derived.structure, periodId: periodOf(derived) }
  const parts = MATERIALS.flatMap((material) => {
    const found = intensityFor(key, material, edition.intensities)
    if (found.kind !== 'known') return []
    const between = Math.max(0, ...found.parts.map(({ betweenBuildingsCv }) => betweenBuildingsCv ?? 0))
    const massKg = found.meanKgPerM2 * grossFloorAreaM2
    const cv = productCv([found.sharedCv, between]).exact
    return massKg > 0 ? [{ material, massKg, cv, pooledOver: found.pooledOver }] : []
  })
  const massKg = parts.reduce((sum, part) => sum + part.massKg, 0)
  if (massKg === 0) return null
  const spread = Math.sqrt(parts.reduce((sum, part) => sum + (part.massKg * part.cv) ** 2, 0)) / massKg
  const total = lognormalFromMean(massKg, productCv([spread, floorAreaCv ?? 0]).exact)
  return {
    massKg,
    lowKg: lognormalQuantile(total, 0.1),
    highKg: lognormalQuantile(total, 0.9),
    parts: parts.map(({ material, massKg: mass }) => ({ material, massKg: mass })).sort((a, b) => b.massKg - a.massKg),
    narrowedBy: narrowedBy(answers, parts),
  }
}

function periodOf({ yearFrom, yearTo }: DerivedSheet): PeriodIdOrUnknown {
  if (yearFrom === null || yearTo === null) return 'unknown'
  return periodOfYear(Math.round((yearFrom + yearTo) / 2))
}

/** The missing answer over which the factors had to be pooled most, by mass; storeys when only they are missing. */
function narrowedBy(answers: SheetAnswers, pooled: readonly Pooled[]): SheetEstimate['narrowedBy'] {
  const doubtOf = (attribute: ArchetypeAttribute) =>
    POOLING_CV[attribute] *
    pooled.reduce((sum, { massKg, pooledOver }) => sum + (pooledOver.includes(attribute) ? massKg : 0), 0)
  const derived = deriveSheet(answers)
  const missing: readonly ArchetypeAttribute[] = [
    ...(derived.structure === 'unknown' ? (['structure'] as const) : []),
    ...(derived.use === 'unknown' ? (['use'] as const) : []),
    ...(derived.yearFrom === null ? (['period'] as const) : []),
  ]
  const [most] = [...missing].sort((a, b) => doubtOf(b) - doubtOf(a))
  if (most && doubtOf(most) > 0) return most === 'period' ? 'constructionYear' : most
  return answers.storeys?.aboveGround ? null : 'storeys'
}

interface Pooled {
  readonly massKg: number
  readonly pooledOver: readonly ArchetypeAttribute[]
}
