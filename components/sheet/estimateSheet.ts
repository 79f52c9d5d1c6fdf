import { intensityFor } from '@/shared/compute/factors/intensityFor'
import { periodOfYear } from '@/shared/compute/factors/periodOfYear'
import { MATERIALS, type Material, type PeriodIdOrUnknown } from '@/shared/compute/factors/vocabulary'
import { lognormalFromMean, lognormalQuantile } from '@/shared/compute/uncertainty/lognormal'
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
    return massKg > 0 ? [{ material, massKg, cv: productCv([found.sharedCv, between]).exact }] : []
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
    narrowedBy: narrowedBy(answers, derived),
  }
}

function periodOf({ yearFrom, yearTo }: DerivedSheet): PeriodIdOrUnknown {
  if (yearFrom === null || yearTo === null) return 'unknown'
  const middle = periodOfYear(Math.round((yearFrom + yearTo) / 2))
  return middle
}

function narrowedBy(answers: SheetAnswers, derived: DerivedSheet): SheetEstimate['narrowedBy'] {
  if (derived.structure === 'unknown') return 'structure'
  if (derived.yearFrom === null) return 'constructionYear'
  if (derived.use === 'unknown') return 'use'
  return answers.storeys?.aboveGround ? null : 'storeys'
}
