import { z } from 'zod'
import { AREA_BASES, COMPONENTS, MATERIALS, PROVENANCES, STRUCTURES, USES } from '@/shared/compute/factors/vocabulary'
import { id, moment } from './primitives'

export const provenance = z.enum(PROVENANCES)
const sourced = { source: z.string(), provenance, note: z.string().nullable() }
const anyUse = z.enum([...USES, 'all'])
const anyStructure = z.enum([...STRUCTURES, 'all'])

/** Kilograms of a material per m² of gross floor area of an archetype. A null median is "missing", never zero. */
export const intensityRow = z.object({
  rowId: id,
  /** Rows taken from one published figure share its error fully. */
  figureId: id,
  structure: anyStructure,
  use: anyUse,
  /** Id of a construction period of the vocabulary, or all. */
  period: z.string(),
  region: z.string(),
  material: z.enum(MATERIALS),
  component: z.enum([...COMPONENTS, 'whole']),
  areaBasis: z.enum(AREA_BASES),
  medianKgPerM2: z.number().nonnegative().nullable(),
  meanKgPerM2: z.number().nonnegative().nullable(),
  p10KgPerM2: z.number().nonnegative().nullable(),
  p90KgPerM2: z.number().nonnegative().nullable(),
  /** Geometric standard deviation between single buildings. */
  gsdBetweenBuildings: z.number().min(1).nullable(),
  /** Coefficient of variation of the mean factor, shared by all buildings that use it. */
  sharedCv: z.number().nonnegative(),
  sampleCount: z.number().int().nonnegative().nullable(),
  ...sourced,
})
export type IntensityRow = z.infer<typeof intensityRow>

export const LIFETIME_MODELS = [
  'fixed',
  'exponential',
  'normal',
  'truncatedNormal',
  'foldedNormal',
  'lognormal',
  'weibull',
  'gamma',
  'logistic',
  'truncatedLogistic',
  'logLogistic',
] as const

export const lifetimeRow = z.object({
  rowId: id,
  use: anyUse,
  structure: anyStructure,
  component: z.enum([...COMPONENTS, 'building']),
  model: z.enum(LIFETIME_MODELS),
  meanYears: z.number().positive(),
  sdYears: z.number().nonnegative(),
  /** Coefficient of variation of the mean life itself, shared by all buildings of the class. */
  sharedCv: z.number().nonnegative(),
  ...sourced,
})
export type LifetimeRow = z.infer<typeof lifetimeRow>

export const densityRow = z.object({
  rowId: id,
  material: z.string(),
  /** What was weighed, in the words of the source. */
  load: z.string(),
  state: z.string(),
  lowKgPerM3: z.number().positive(),
  highKgPerM3: z.number().positive(),
  ...sourced,
})
export const wasteCodeRow = z.object({
  rowId: id,
  code: z.string(),
  isHazardous: z.boolean(),
  text: z.string(),
  material: z.string().nullable(),
  mirrorHazardousCode: z.string().nullable(),
  ...sourced,
})
export type WasteCodeRow = z.infer<typeof wasteCodeRow>
export const suspicionRow = z.object({
  rowId: id,
  substance: z.string(),
  component: z.string(),
  element: z.string(),
  fromYear: z.number().int().nullable(),
  toYear: z.number().int().nullable(),
  suspicion: z.string(),
  caution: z.string(),
  ...sourced,
})
export type SuspicionRow = z.infer<typeof suspicionRow>

export const edition = z.object({
  editionId: id,
  number: z.number().int().positive(),
  name: z.string(),
  state: z.enum(['draft', 'issued']),
  issuedAt: moment.nullable(),
  issuedByName: z.string().nullable(),
  /** What is new in it, in the words of who issued it. */
  note: z.string().nullable().optional(),
})
export type Edition = z.infer<typeof edition>

export const editionRows = z.object({
  intensities: z.array(intensityRow),
  lifetimes: z.array(lifetimeRow),
  densities: z.array(densityRow),
  wasteCodes: z.array(wasteCodeRow),
  suspicions: z.array(suspicionRow),
})
export type EditionRows = z.infer<typeof editionRows>

export const fullEdition = edition.extend({ rows: editionRows })
export type FullEdition = z.infer<typeof fullEdition>

export const editionForDevice = edition.extend({
  intensities: z.array(intensityRow),
  suspicions: z.array(suspicionRow),
})
export type EditionForDevice = z.infer<typeof editionForDevice>
