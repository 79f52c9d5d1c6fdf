import { intensityFor } from '@/shared/compute/factors/intensityFor'
import { periodOfYear } from '@/shared/compute/factors/periodOfYear'
import { MATERIALS, type Material } from '@/shared/compute/factors/vocabulary'
import { lognormalFromMean } from '@/shared/compute/uncertainty/lognormalFromMean'
import { lognormalQuantile } from '@/shared/compute/uncertainty/lognormalQuantile'
import { productCv } from '@/shared/compute/uncertainty/productCv'
import { BULK_DENSITIES } from '@/shared/compute/waste/bulkDensities'
import { hazardSuspicions, type HazardSuspicion } from '@/shared/compute/waste/hazardSuspicions'
import { looseVolume } from '@/shared/compute/waste/looseVolume'
import { proposeWasteCode } from '@/shared/compute/waste/proposeWasteCode'
import type { EditionRows } from '@/shared/schemas/factorBook'
import type { Inventory, InventoryLine } from '@/shared/schemas/listing'
import type { RunBuilding } from '@/shared/schemas/run'

const [LOW, HIGH] = [0.1, 0.9]

/**
 * The inventory of one building of a run: each material by component with P10 and P90 for a single building, proposed
 * waste codes, and what to have sampled. Masses add up to those of the run; the spread holds the factor's own error, the
 * difference between buildings and the error of the floor area.
 */
export function takeInventory(building: RunBuilding, { intensities }: Pick<EditionRows, 'intensities'>): Inventory {
  const { use, structure, yearFrom, yearTo, footprintM2, grossFloorAreaM2 } = building
  const suspicions = hazardSuspicions({
    construction: yearFrom === null || yearTo === null ? 'unknown' : { fromYear: yearFrom, toYear: yearTo + 1 },
  })
  return {
    use,
    structure,
    yearFrom,
    yearTo,
    footprintM2,
    grossFloorAreaM2,
    lines: MATERIALS.flatMap((material) => linesOf(material, building, intensities, suspicions)),
    suspicions: suspicions.map(({ row: { substance, element, code, source, provenance }, because }) => ({
      substance,
      element,
      code,
      because,
      source,
      provenance,
    })),
  }
}

function linesOf(
  material: Material,
  building: RunBuilding,
  intensities: EditionRows['intensities'],
  suspicions: readonly HazardSuspicion[],
): InventoryLine[] {
  const { use, structure, yearFrom, yearTo, floorAreaCv, massByMaterialKg } = building
  const wholeKg = massByMaterialKg[material] ?? 0
  const periodId = yearFrom === null || yearTo === null ? 'unknown' : periodOfYear(Math.round((yearFrom + yearTo) / 2))
  const found = intensityFor({ use, structure, periodId }, material, intensities)
  if (wholeKg <= 0 || found.kind !== 'known') return []
  return found.parts.map(({ component, meanKgPerM2, betweenBuildingsCv }): InventoryLine => {
    const likely = (wholeKg * meanKgPerM2) / found.meanKgPerM2
    const band = lognormalFromMean(likely, productCv([found.sharedCv, betweenBuildingsCv ?? 0, floorAreaCv]).exact)
    const suspected = suspicions.filter(
      ({ row }) => row.materials.includes(material) && (component === 'whole' || row.components.includes(component)),
    )
    const proposal = proposeWasteCode(
      material,
      suspected.map(({ row }) => row.code),
    )
    return {
      material,
      component,
      massKg: { low: lognormalQuantile(band, LOW), likely, high: lognormalQuantile(band, HIGH) },
      looseVolumeM3: looseVolume(likely, BULK_DENSITIES[material].likelyKgPerM3),
      code: proposal.code,
      alternatives: [...proposal.alternatives],
      mustAsk: proposal.mustAsk,
    }
  })
}
