import type { Material } from '@/shared/compute/factors/vocabulary'
import type { EditionRows, SuspicionRow, WasteCodeRow } from '@/shared/schemas/factorBook'
import { optionalNumber, readCsv, toProvenance } from './readCsv'
import { stableId } from '@/server/stableId'

/** Material words of the tables → materials of the tally. */
const MATERIAL_OF_WORD: Readonly<Record<string, Material>> = {
  concrete: 'concrete',
  brick: 'masonry-units',
  ceramics: 'ceramics',
  timber: 'timber',
  glass: 'glass',
  plastics: 'plastics',
  bitumen: 'bitumen',
  copper: 'copper',
  aluminium: 'aluminium',
  steel: 'steel',
  'mixed metals': 'other-metals',
  gypsum: 'gypsum',
  'mineral insulation': 'mineral-insulation',
  'plastic insulation': 'plastic-insulation',
  'mineral insulation|plastic insulation': 'mineral-insulation',
  'asbestos cement': 'asbestos-cement',
  'mixed mineral': 'mortar-plaster',
  soil: 'other',
}

const materialOf = (word: string | undefined): string | null => (word ? (MATERIAL_OF_WORD[word] ?? word) : null)

/** List of Waste, chapter 17. */
export function publishedWasteCodes(): WasteCodeRow[] {
  return readCsv('waste_codes.csv').map((row) => ({
    rowId: stableId('waste-code', row['code'] ?? ''),
    code: row['code'] ?? '',
    isHazardous: row['hazardous'] === 'yes',
    text: row['text'] ?? '',
    material: materialOf(row['material']),
    mirrorHazardousCode: row['mirror_hazardous_code'] || null,
    source: row['source'] ?? '',
    provenance: toProvenance(row['provenance']),
    note: null,
  }))
}

/** Bulk densities in kg/m³; ratios (swell factors) are not densities and stay out. */
export function publishedDensities(): EditionRows['densities'] {
  return readCsv('bulk_densities.csv').flatMap((row) => {
    const [low, high] = [optionalNumber(row['low']), optionalNumber(row['high'])]
    if (row['unit'] !== 'kg/m3' || low === null || high === null) return []
    return {
      rowId: stableId('density', row['item'] ?? ''),
      material: materialOf(row['material']) ?? '',
      load: row['item'] ?? '',
      state: row['state'] ?? '',
      lowKgPerM3: low,
      highKgPerM3: high,
      source: row['source'] ?? '',
      provenance: toProvenance(row['provenance']),
      note: null,
    }
  })
}

/** Suspicions by age and element, for sampling by a licensed person; never a finding. */
export function publishedSuspicions(): SuspicionRow[] {
  return readCsv('hazard_suspicions.csv').map((row, position) => ({
    rowId: stableId('suspicion', position, row['material_or_element'] ?? ''),
    substance: row['substance'] ?? '',
    component: row['component'] ?? '',
    element: row['material_or_element'] ?? '',
    fromYear: optionalNumber(row['from_year']),
    toYear: optionalNumber(row['to_year']),
    suspicion: row['suspicion'] ?? '',
    caution: row['caution'] ?? '',
    source: row['source'] ?? '',
    provenance: toProvenance(row['provenance']),
    note: null,
  }))
}
