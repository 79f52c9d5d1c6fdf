import type { Component, Material } from '@/shared/compute/factors/vocabulary'
import type { IntensityRow } from '@/shared/schemas/factorBook'
import { stableId } from '@/server/stableId'

/**
 * Where a material sits in a building, as shares of its mass: common practice of estimators, editable.
 * Materials that are not named stay with the structure.
 */
const SPLIT: Readonly<Partial<Record<Material, Readonly<Partial<Record<Component, number>>>>>> = {
  concrete: { structure: 0.95, 'fit-out': 0.05 },
  'masonry-units': { structure: 0.9, envelope: 0.06, 'fit-out': 0.04 },
  'mortar-plaster': { structure: 0.45, envelope: 0.2, 'fit-out': 0.35 },
  ceramics: { roof: 0.6, 'fit-out': 0.4 },
  steel: { structure: 0.9, services: 0.1 },
  aluminium: { openings: 0.5, envelope: 0.5 },
  copper: { services: 0.9, roof: 0.1 },
  timber: { structure: 0.7, roof: 0.06, openings: 0.08, 'fit-out': 0.16 },
  glass: { openings: 1 },
  gypsum: { 'fit-out': 1 },
  'mineral-insulation': { envelope: 0.6, roof: 0.4 },
  'plastic-insulation': { envelope: 0.7, roof: 0.3 },
  plastics: { services: 0.4, 'fit-out': 0.4, openings: 0.2 },
  bitumen: { roof: 1 },
}

const NOTE = 'Split by component: common practice, editable; the published figure is for the whole building.'

/** One row for a whole building → one a component; they keep the figure's identity, so its error stays shared. */
export function splitByComponent(row: IntensityRow): IntensityRow[] {
  const shares = SPLIT[row.material]
  if (!shares) return [{ ...row, component: 'structure' }]
  return Object.entries(shares).map(([component, share]) => ({
    ...row,
    rowId: stableId(row.rowId, component),
    component: component as Component,
    medianKgPerM2: scaled(row.medianKgPerM2, share),
    meanKgPerM2: scaled(row.meanKgPerM2, share),
    p10KgPerM2: scaled(row.p10KgPerM2, share),
    p90KgPerM2: scaled(row.p90KgPerM2, share),
    note: `${row.note ?? ''} ${NOTE} Share ${share}.`.trim(),
  }))
}

function scaled(value: number | null, share: number): number | null {
  return value === null ? null : value * share
}
