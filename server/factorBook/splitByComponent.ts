import { COMPONENT_SHARES } from '@/shared/compute/factors/componentShares'
import type { Component } from '@/shared/compute/factors/vocabulary'
import type { IntensityRow } from '@/shared/schemas/factorBook'
import { stableId } from '@/server/stableId'

const NOTE = 'Split by component: common practice, editable; the published figure is for the whole building.'

/** One row for a whole building → one a component; they keep the figure's identity, so its error stays shared. */
export function splitByComponent(row: IntensityRow): IntensityRow[] {
  return Object.entries(COMPONENT_SHARES[row.material]).map(([component, share]) => ({
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
