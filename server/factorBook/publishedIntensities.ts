import type { Material, Structure, Use } from '@/shared/compute/factors/vocabulary'
import type { IntensityRow } from '@/shared/schemas/factorBook'
import { DEFAULT_SHARED_CV } from '@/shared/compute/factors/sharedCvDefaults'
import { optionalNumber, readCsv, toProvenance } from './readCsv'
import { stableId } from '@/server/stableId'
import { splitByComponent } from './splitByComponent'

type TableRow = Record<string, string>

/** Materials of the tally ← the names of the table. Constituents of concrete (cement, aggregates) stay out: they would count twice. */
const TABLE_NAME: readonly (readonly [Material, string])[] = [
  ['concrete', 'concrete'],
  ['masonry-units', 'brick/masonry units'],
  ['mortar-plaster', 'mortar plaster'],
  ['ceramics', 'ceramics'],
  ['steel', 'steel'],
  ['aluminium', 'aluminium'],
  ['copper', 'copper'],
  ['timber', 'timber'],
  ['glass', 'glass'],
  ['gypsum', 'gypsum'],
  ['mineral-insulation', 'mineral wool'],
  ['plastics', 'plastics'],
  ['bitumen', 'bitumen'],
]

const TABLE_STRUCTURE: readonly (readonly [Structure | 'all', string])[] = [
  ['reinforced-concrete', 'reinforced concrete'],
  ['precast-panel', 'reinforced concrete'],
  ['masonry-timber-floors', 'masonry'],
  ['masonry-concrete-floors', 'masonry'],
  ['timber-frame', 'timber'],
  ['mass-timber', 'timber'],
  ['steel-frame', 'steel frame'],
  ['all', 'all structures'],
]

const TABLE_FUNCTION: readonly (readonly [Use | 'all', string])[] = [
  ['all', 'all'],
  ['single-family', 'residential single-family'],
  ['terraced', 'residential single-family'],
  ['multi-family', 'residential multi-family'],
  ['office', 'non-residential'],
  ['retail', 'non-residential'],
  ['public', 'non-residential'],
  ['hotel', 'non-residential'],
  ['industrial', 'non-residential'],
  ['warehouse', 'non-residential'],
]

/** Fewer buildings than this say too little: the next wider figure is taken, or none. */
const LEAST_BUILDINGS = 10

const BASIS_NOTE = 'Basis taken as gross floor area; part of the source does not state it.'

/** Material intensities of the two open datasets, the better documented first. */
export function publishedIntensities(): IntensityRow[] {
  const table = readCsv('material_intensity_summary.csv')
  const rows: IntensityRow[] = []
  for (const [structure, structureName] of TABLE_STRUCTURE) {
    for (const [use, functionName] of TABLE_FUNCTION) {
      for (const [material, materialName] of TABLE_NAME) {
        const found = findFigure(table, structureName, functionName, materialName)
        if (found) rows.push(...splitByComponent(toRow(found, structure, use, material)))
      }
    }
  }
  return rows
}

/** First source with enough buildings; else, for all functions, the European range of the second source. */
function findFigure(
  table: readonly TableRow[],
  structure: string,
  use: string,
  material: string,
): TableRow | undefined {
  const candidates = table.filter(
    (row) => row['structure'] === structure && row['material'] === material && !isMostlyZero(row),
  )
  const wellFounded = candidates.find(
    (row) => row['region'] === 'all' && row['function'] === use && Number(row['n']) >= LEAST_BUILDINGS,
  )
  if (wellFounded) return wellFounded
  const rangeFunction = use === 'all' ? 'residential multi-family' : use
  const hasOwnFunction =
    use !== 'all' &&
    candidates.some(
      (row) => row['region'] === 'all' && row['function'] === 'all' && Number(row['n']) >= LEAST_BUILDINGS,
    )
  return hasOwnFunction
    ? undefined
    : candidates.find((row) => row['region'] === 'OECD_EU15' && row['function'] === rangeFunction)
}

/** Half the sample without the material says more about the sample than about the archetype. */
function isMostlyZero(row: TableRow): boolean {
  return Number(row['n_zero']) * 2 >= Number(row['n'])
}

function toRow(row: TableRow, structure: Structure | 'all', use: Use | 'all', material: Material): IntensityRow {
  const medianKgPerM2 = optionalNumber(row['median'])
  return {
    rowId: stableId('intensity', structure, use, material),
    figureId: stableId('figure', ...['structure', 'function', 'material', 'region'].map((column) => row[column] ?? '')),
    structure,
    use,
    period: 'all',
    region: row['region'] ?? 'all',
    material,
    component: 'whole',
    areaBasis: 'GFA',
    medianKgPerM2,
    meanKgPerM2: optionalNumber(row['mean']) ?? medianKgPerM2,
    p10KgPerM2: optionalNumber(row['p10']),
    p90KgPerM2: optionalNumber(row['p90']),
    gsdBetweenBuildings: optionalNumber(row['gsd_between_buildings']),
    sharedCv: DEFAULT_SHARED_CV[material],
    sampleCount: optionalNumber(row['n']),
    source: row['source'] ?? '',
    provenance: toProvenance(row['provenance']),
    note: BASIS_NOTE,
  }
}
