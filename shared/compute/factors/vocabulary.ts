/** What a building is used for. A building of several uses carries one area per use. */
export const USES = [
  'single-family',
  'terraced',
  'multi-family',
  'office',
  'retail',
  'public',
  'hotel',
  'industrial',
  'warehouse',
  'agricultural',
  'ancillary',
  'other',
] as const

/** What carries a building. */
export const STRUCTURES = [
  'reinforced-concrete',
  'precast-panel',
  'masonry-timber-floors',
  'masonry-concrete-floors',
  'timber-frame',
  'mass-timber',
  'steel-frame',
  'hybrid',
  'earth',
] as const

/** Not seen, not known: a legal value of every attribute, and never the same as zero or none. */
export const UNKNOWN = 'unknown'

/**
 * Construction periods between breaks of building practice. Half-open: `fromYear` belongs to the period,
 * `toYear` is the first year of the next one; null is an open end.
 */
export const PERIODS = [
  { id: 'before-1919', fromYear: null, toYear: 1919 },
  { id: '1919-1945', fromYear: 1919, toYear: 1946 },
  { id: '1946-1960', fromYear: 1946, toYear: 1961 },
  { id: '1961-1975', fromYear: 1961, toYear: 1976 },
  { id: '1976-1990', fromYear: 1976, toYear: 1991 },
  { id: '1991-2005', fromYear: 1991, toYear: 2006 },
  { id: 'from-2006', fromYear: 2006, toYear: null },
] as const

/** Identifiers of the construction periods, oldest first. */
export const PERIOD_IDS = [
  'before-1919',
  '1919-1945',
  '1946-1960',
  '1961-1975',
  '1976-1990',
  '1991-2005',
  'from-2006',
] as const

/** Materials of the tally. Reinforcement counts as steel; cement and aggregates are inside concrete. */
export const MATERIALS = [
  'concrete',
  'masonry-units',
  'mortar-plaster',
  'natural-stone',
  'ceramics',
  'steel',
  'aluminium',
  'copper',
  'other-metals',
  'timber',
  'glass',
  'gypsum',
  'mineral-insulation',
  'plastic-insulation',
  'plastics',
  'bitumen',
  'asbestos-cement',
  'other',
] as const

/** Groups of materials for charts and tables, in drawing order. */
export const MATERIAL_GROUPS = ['mineral', 'metal', 'biogenic', 'insulation', 'polymer', 'hazardous', 'other'] as const

/** Parts of a building that wear at their own pace and leave it on their own routes. */
export const COMPONENTS = ['structure', 'envelope', 'roof', 'openings', 'fit-out', 'services'] as const

/** What a square metre (or a cubic metre) means. Never combined without a stated conversion. */
export const AREA_BASES = ['GFA', 'internal', 'NFA', 'usable', 'footprint', 'volume'] as const

/** Where a figure comes from; figures of the last two kinds are editable defaults and marked as such. */
export const PROVENANCES = ['published', 'open-dataset', 'common-practice', 'from-memory'] as const

export type Use = (typeof USES)[number]
export type UseOrUnknown = Use | typeof UNKNOWN
export type Structure = (typeof STRUCTURES)[number]
export type StructureOrUnknown = Structure | typeof UNKNOWN
export type Period = (typeof PERIODS)[number]
export type PeriodId = (typeof PERIOD_IDS)[number]
export type PeriodIdOrUnknown = PeriodId | typeof UNKNOWN
export type Material = (typeof MATERIALS)[number]
export type MaterialGroup = (typeof MATERIAL_GROUPS)[number]
export type Component = (typeof COMPONENTS)[number]
export type AreaBasis = (typeof AREA_BASES)[number]
export type Provenance = (typeof PROVENANCES)[number]

/** The group each material is drawn and added up in. */
export const MATERIAL_GROUP_OF: Readonly<Record<Material, MaterialGroup>> = {
  concrete: 'mineral',
  'masonry-units': 'mineral',
  'mortar-plaster': 'mineral',
  'natural-stone': 'mineral',
  ceramics: 'mineral',
  glass: 'mineral',
  gypsum: 'mineral',
  steel: 'metal',
  aluminium: 'metal',
  copper: 'metal',
  'other-metals': 'metal',
  timber: 'biogenic',
  'mineral-insulation': 'insulation',
  'plastic-insulation': 'insulation',
  plastics: 'polymer',
  bitumen: 'polymer',
  'asbestos-cement': 'hazardous',
  other: 'other',
}
