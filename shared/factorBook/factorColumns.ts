import {
  AREA_BASES,
  COMPONENTS,
  MATERIALS,
  PERIOD_IDS,
  PROVENANCES,
  STRUCTURES,
  USES,
} from '@/shared/compute/factors/vocabulary'
import { LIFETIME_MODELS, type EditionRows } from '@/shared/schemas/factorBook'

/** One of the tables of an edition. */
export type FactorPart = keyof EditionRows

/** The tables of an edition, in the order of the screen. */
export const FACTOR_PARTS = ['intensities', 'lifetimes', 'densities', 'wasteCodes', 'suspicions'] as const

/** What a cell of a table of the factor book may hold. Limits are those beyond which a figure is absurd. */
export interface FactorColumn {
  readonly field: string
  readonly kind: 'choice' | 'text' | 'number' | 'yes-no'
  readonly choices?: readonly string[]
  readonly isOptional?: boolean
  readonly isWhole?: boolean
  readonly least?: number
  readonly most?: number
  /** The least value itself is not allowed. */
  readonly isAboveLeast?: boolean
  readonly longest?: number
}

const anyUse: FactorColumn = { field: 'use', kind: 'choice', choices: ['all', ...USES] }
const anyStructure: FactorColumn = { field: 'structure', kind: 'choice', choices: ['all', ...STRUCTURES] }
const words = (field: string, longest: number, isOptional = false): FactorColumn => ({
  field,
  kind: 'text',
  longest,
  isOptional,
})
const kgPerM2 = (field: string): FactorColumn => ({ field, kind: 'number', isOptional: true, least: 0, most: 5_000 })
const year = (field: string): FactorColumn => ({
  field,
  kind: 'number',
  isOptional: true,
  isWhole: true,
  least: 1_000,
  most: 2_300,
})
const sharedCv: FactorColumn = { field: 'sharedCv', kind: 'number', least: 0, most: 2 }
const sourced: readonly FactorColumn[] = [
  words('source', 2_000),
  { field: 'provenance', kind: 'choice', choices: PROVENANCES },
  words('note', 2_000, true),
]

/** The columns of each table, as forms ask for them. */
export const FACTOR_COLUMNS: Readonly<Record<FactorPart, readonly FactorColumn[]>> = {
  intensities: [
    { field: 'material', kind: 'choice', choices: MATERIALS },
    anyStructure,
    anyUse,
    { field: 'period', kind: 'choice', choices: ['all', ...PERIOD_IDS] },
    { field: 'component', kind: 'choice', choices: ['whole', ...COMPONENTS] },
    words('region', 80),
    { field: 'areaBasis', kind: 'choice', choices: AREA_BASES },
    kgPerM2('medianKgPerM2'),
    kgPerM2('meanKgPerM2'),
    kgPerM2('p10KgPerM2'),
    kgPerM2('p90KgPerM2'),
    { field: 'gsdBetweenBuildings', kind: 'number', isOptional: true, least: 1, most: 50 },
    sharedCv,
    { field: 'sampleCount', kind: 'number', isOptional: true, isWhole: true, least: 0, most: 10_000_000 },
    ...sourced,
  ],
  lifetimes: [
    anyUse,
    anyStructure,
    { field: 'component', kind: 'choice', choices: ['building', ...COMPONENTS] },
    { field: 'model', kind: 'choice', choices: LIFETIME_MODELS },
    { field: 'meanYears', kind: 'number', least: 0, isAboveLeast: true, most: 1_000 },
    { field: 'sdYears', kind: 'number', least: 0, most: 1_000 },
    sharedCv,
    ...sourced,
  ],
  densities: [
    words('material', 80),
    words('load', 160),
    words('state', 160),
    { field: 'lowKgPerM3', kind: 'number', least: 0, isAboveLeast: true, most: 23_000 },
    { field: 'highKgPerM3', kind: 'number', least: 0, isAboveLeast: true, most: 23_000 },
    ...sourced,
  ],
  wasteCodes: [
    words('code', 20),
    { field: 'isHazardous', kind: 'yes-no' },
    words('text', 500),
    words('material', 80, true),
    words('mirrorHazardousCode', 80, true),
    ...sourced,
  ],
  suspicions: [
    words('substance', 120),
    words('component', 120),
    words('element', 400),
    year('fromYear'),
    year('toYear'),
    words('suspicion', 400),
    words('caution', 1_000),
    ...sourced,
  ],
}
