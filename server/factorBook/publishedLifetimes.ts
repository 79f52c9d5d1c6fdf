import type { Structure, Use } from '@/shared/compute/factors/vocabulary'
import type { LifetimeRow } from '@/shared/schemas/factorBook'
import { readCsv, toProvenance } from './readCsv'
import { stableId } from '@/server/stableId'

const OFFICE_LIKE: readonly Use[] = ['office', 'retail', 'hotel', 'public']
const HALL_LIKE: readonly Use[] = ['industrial', 'warehouse', 'agricultural', 'ancillary']
const TIMBER: readonly Structure[] = ['timber-frame', 'mass-timber']

/** How sure the mean life of a class is before anything was calibrated: [C], a fifth. */
const SHARED_CV_OF_LIFE = 0.2

/** The proposed lives of buildings and components, with their source as the table states it. */
export function publishedLifetimes(): LifetimeRow[] {
  const table = readCsv('lifetimes.csv')
  const find = (words: string) => {
    const row = table.find((candidate) => candidate['building_or_component'] === words && candidate['value2'] !== '')
    if (!row) throw new Error(`lifetimes.csv has no row "${words}"`)
    return row
  }
  const make = (
    words: string,
    model: LifetimeRow['model'],
    use: Use | 'all',
    structure: Structure | 'all',
    component: LifetimeRow['component'],
  ): LifetimeRow => {
    const row = find(words)
    return {
      rowId: stableId('lifetime', use, structure, component),
      use,
      structure,
      component,
      model,
      meanYears: Number(row['value1_years']),
      sdYears: Number(row['value2']),
      sharedCv: SHARED_CV_OF_LIFE,
      source: row['source'] ?? '',
      provenance: toProvenance(row['provenance']),
      note: row['note'] ?? null,
    }
  }
  return [
    make('residential masonry / RC', 'weibull', 'all', 'all', 'building'),
    ...TIMBER.map((structure) => make('residential timber', 'weibull', 'all', structure, 'building')),
    ...OFFICE_LIKE.map((use) => make('office, retail', 'weibull', use, 'all', 'building')),
    ...HALL_LIKE.map((use) => make('industrial, warehouse', 'weibull', use, 'all', 'building')),
    make('component: envelope (facade, insulation)', 'lognormal', 'all', 'all', 'envelope'),
    make('component: pitched roof covering', 'lognormal', 'all', 'all', 'roof'),
    make('component: openings (windows, doors)', 'lognormal', 'all', 'all', 'openings'),
    make('component: fit-out (partitions, floor finishes, ceilings)', 'lognormal', 'all', 'all', 'fit-out'),
    make('component: services (heating, electrical, plumbing)', 'lognormal', 'all', 'all', 'services'),
  ]
}
