import { z } from 'zod'
import { COMPONENTS, MATERIALS, STRUCTURES, USES } from '@/shared/compute/factors/vocabulary'
import { provenance } from './factorBook'
import { calendarYear, id } from './primitives'
import { material, runSummary } from './run'

const use = z.enum([...USES, 'unknown'])
const structure = z.enum([...STRUCTURES, 'unknown'])
const component = z.enum([...COMPONENTS, 'whole'])

/** What stands; what comes down; what is renewed in what stands. */
export const RECEIPT_KINDS = ['stock', 'demolition', 'refurbishment'] as const

/** A figure of a run, or a part of one: everything left out counts all. */
export const receiptFigure = z.object({
  kind: z.enum(RECEIPT_KINDS),
  material: z.enum([...MATERIALS, 'all']),
  /** Both null for the stock; both given for a flow, the ends included. */
  fromYear: calendarYear.nullable(),
  toYear: calendarYear.nullable(),
  use: use.nullable(),
  structure: structure.nullable(),
  /** Period id of the vocabulary or `unknown`. */
  period: z.string().max(40).nullable(),
  buildingId: id.nullable(),
})
export type ReceiptFigure = z.infer<typeof receiptFigure>

/** Floor area × content = mass, for one material and component of a group. */
export const receiptTerm = z.object({
  material,
  component,
  /** Counted floor area [m²]: all of it for the stock; times the chance to come down, or the renewals, for a flow. */
  countedAreaM2: z.number(),
  contentKgPerM2: z.number(),
  massKg: z.number(),
  rowIds: z.array(id),
})
export type ReceiptTerm = z.infer<typeof receiptTerm>

/** Buildings of one use, structure and period. */
export const receiptGroup = z.object({
  use,
  structure,
  period: z.string(),
  buildingCount: z.number().int(),
  floorAreaM2: z.number(),
  massKg: z.number(),
  terms: z.array(receiptTerm),
  /** Wanted materials of which the book has no figure: not available, never zero. */
  missing: z.array(material),
})
export type ReceiptGroup = z.infer<typeof receiptGroup>

/** One building, or a slice of one that has another use, structure or age. */
export const receiptBuilding = z.object({
  buildingId: id,
  label: z.string(),
  use,
  structure,
  period: z.string(),
  yearFrom: calendarYear.nullable(),
  yearTo: calendarYear.nullable(),
  floorAreaM2: z.number(),
  floorAreaCv: z.number(),
  hazardMultiplier: z.number(),
  /** Chance to come down within the years; null for the stock. */
  chance: z.number().nullable(),
  massKg: z.number(),
})
export type ReceiptBuilding = z.infer<typeof receiptBuilding>

/** A row of the factor book with its source, and what of the figure rests on it alone or with others. */
export const receiptFactorRow = z.object({
  rowId: id,
  material,
  component,
  use: z.string(),
  structure: z.string(),
  period: z.string(),
  meanKgPerM2: z.number().nullable(),
  medianKgPerM2: z.number().nullable(),
  sharedCv: z.number(),
  sampleCount: z.number().int().nullable(),
  source: z.string(),
  provenance,
})
export type ReceiptFactorRow = z.infer<typeof receiptFactorRow>

export const receiptLifetime = z.object({
  lifetimeId: id,
  component: z.enum([...COMPONENTS, 'building']),
  use: z.string(),
  structure: z.string(),
  model: z.string(),
  meanYears: z.number(),
  sdYears: z.number(),
  /** Set by the scenario instead of the book. */
  isOfScenario: z.boolean(),
  source: z.string(),
  provenance,
})
export type ReceiptLifetime = z.infer<typeof receiptLifetime>

export const receipt = z.object({
  run: runSummary,
  figure: receiptFigure,
  massKg: z.number(),
  /** P10 and P90 where the run states a band for just this figure. */
  band: z.object({ p10Kg: z.number(), p90Kg: z.number() }).nullable(),
  groups: z.array(receiptGroup),
  /** Only for one group or one building; else there are too many to read. */
  buildings: z.array(receiptBuilding),
  factorRows: z.array(receiptFactorRow),
  lifetimes: z.array(receiptLifetime),
})
export type Receipt = z.infer<typeof receipt>
