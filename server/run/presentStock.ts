import type { Material } from '@/shared/compute/factors/vocabulary'
import { massOfBuilding, type DistrictComputation } from '@/shared/compute/run/computeDistrict'
import { massBand } from '@/shared/compute/run/massBand'
import type { MassEstimate } from '@/shared/compute/run/run.types'
import { totalVariance } from '@/shared/compute/run/stockOfCells'
import type { IntensityRow } from '@/shared/schemas/factorBook'
import type { RunResult, StockCell } from '@/shared/schemas/run'

/** Standing stock as the contract shows it. */
export function presentStock(district: DistrictComputation, intensities: readonly IntensityRow[]): RunResult['stock'] {
  const fromMemory = new Set(
    intensities.filter(({ provenance }) => provenance === 'from-memory').map(({ rowId }) => rowId),
  )
  const byMaterial = [...district.stock.byMaterial].map(([material, estimate]) => {
    const factorRowIds = rowIdsOf(material, district)
    return {
      material,
      band: toBand(estimate),
      missingCount: district.cells.filter(({ archetype }) => district.archetypes[archetype]!.missing.includes(material))
        .length,
      factorRowIds,
      isFromMemory: factorRowIds.some((rowId) => fromMemory.has(rowId)),
    }
  })
  return {
    total: toBand(district.stock.total),
    byMaterial: byMaterial.sort((a, b) => b.band.meanKg - a.band.meanKg),
    cells: presentCells(district),
  }
}

function toBand(estimate: MassEstimate) {
  return massBand(estimate.meanKg, totalVariance(estimate.varianceByCauseKg2))
}

function rowIdsOf(material: Material, { archetypes }: DistrictComputation): string[] {
  return [...new Set(archetypes.flatMap(({ rowIdsByMaterial }) => rowIdsByMaterial.get(material) ?? []))].sort()
}

function presentCells({ cells, archetypes }: DistrictComputation): StockCell[] {
  const byArchetype = new Map<number, StockCell & { massKg: Partial<Record<Material, number>> }>()
  cells.forEach((cell) => {
    const archetype = archetypes[cell.archetype]!
    const { use, structure, period } = archetype
    const sum = byArchetype.get(cell.archetype) ?? {
      use,
      structure,
      period,
      buildingCount: 0,
      floorAreaM2: 0,
      massKg: {},
    }
    sum.buildingCount += cell.buildingCount
    sum.floorAreaM2 += cell.floorAreaM2
    for (const [material, massKg] of massOfBuilding(cell, archetype))
      sum.massKg[material] = (sum.massKg[material] ?? 0) + massKg
    byArchetype.set(cell.archetype, sum)
  })
  return [...byArchetype.values()]
}
