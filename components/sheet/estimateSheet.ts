import { intensityFor } from '@/shared/compute/factors/intensityFor'
import { periodOfYear } from '@/shared/compute/factors/periodOfYear'
import { MATERIALS, type Material, type PeriodIdOrUnknown } from '@/shared/compute/factors/vocabulary'
import { lognormalFromMean } from '@/shared/compute/uncertainty/lognormalFromMean'
import { lognormalQuantile } from '@/shared/compute/uncertainty/lognormalQuantile'
import { productCv } from '@/shared/compute/uncertainty/productCv'
import { deriveSheet } from '@/shared/schemas/deriveSheet'
import type { EditionForDevice } from '@/shared/schemas/factorBook'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { sliceSheet, type SheetSlice } from '@/shared/schemas/sliceSheet'
import { narrowedBy, type NarrowingAnswer, type PooledMass } from './narrowedBy'

export interface SheetEstimate {
  readonly massKg: number
  readonly lowKg: number
  readonly highKg: number
  /** Heaviest first. */
  readonly parts: readonly { readonly material: Material; readonly massKg: number }[]
  /** The missing answer that would narrow it most; null when none is missing. */
  readonly narrowedBy: NarrowingAnswer | null
}

interface MaterialMass {
  massKg: number
  sdKg: number
}

/**
 * Tonnes of one building from its answers as they stand, with P10 and P90; null while too little is answered. Each use and
 * part is tallied with its own factors; their errors are taken as one, which is the wide side.
 */
export function estimateSheet(answers: SheetAnswers, edition: EditionForDevice): SheetEstimate | null {
  const { floorAreaCv } = deriveSheet(answers)
  const byMaterial = new Map<Material, MaterialMass>()
  const pooled: PooledMass[] = []
  for (const slice of sliceSheet(answers)) {
    for (const { material, massKg, cv, pooledOver } of massesOf(slice, edition)) {
      const sum = byMaterial.get(material) ?? { massKg: 0, sdKg: 0 }
      byMaterial.set(material, { massKg: sum.massKg + massKg, sdKg: sum.sdKg + massKg * cv })
      pooled.push({ massKg, pooledOver })
    }
  }
  const parts = [...byMaterial].map(([material, { massKg }]) => ({ material, massKg }))
  const massKg = parts.reduce((sum, part) => sum + part.massKg, 0)
  if (massKg === 0) return null
  const spread = Math.hypot(...[...byMaterial.values()].map(({ sdKg }) => sdKg)) / massKg
  const total = lognormalFromMean(massKg, productCv([spread, floorAreaCv ?? 0]).exact)
  return {
    massKg,
    lowKg: lognormalQuantile(total, 0.1),
    highKg: lognormalQuantile(total, 0.9),
    parts: parts.sort((a, b) => b.massKg - a.massKg),
    narrowedBy: narrowedBy(answers, pooled),
  }
}

function massesOf(slice: SheetSlice, { intensities }: EditionForDevice) {
  const key = { use: slice.use, structure: slice.structure, periodId: periodOf(slice) }
  return MATERIALS.flatMap((material) => {
    const found = intensityFor(key, material, intensities)
    if (found.kind !== 'known') return []
    const between = Math.max(0, ...found.parts.map(({ betweenBuildingsCv }) => betweenBuildingsCv ?? 0))
    const massKg = found.meanKgPerM2 * slice.grossFloorAreaM2
    const cv = productCv([found.sharedCv, between]).exact
    return massKg > 0 ? [{ material, massKg, cv, pooledOver: found.pooledOver }] : []
  })
}

function periodOf({ yearFrom, yearTo }: SheetSlice): PeriodIdOrUnknown {
  if (yearFrom === null || yearTo === null) return 'unknown'
  return periodOfYear(Math.round((yearFrom + yearTo) / 2))
}
