import { z } from 'zod'
import { COMPONENTS, PROVENANCES, STRUCTURES, USES } from '@/shared/compute/factors/vocabulary'
import { calendarDay, calendarYear, id, moment } from './primitives'
import { material } from './run'

const lowLikelyHigh = z.object({ low: z.number(), likely: z.number(), high: z.number() })

/** One material in one component of a building that is to come down. */
export const inventoryLine = z.object({
  material,
  /** `whole` where the factor book does not split the figure. */
  component: z.enum([...COMPONENTS, 'whole']),
  /** P10, mean, P90 for this one building. */
  massKg: lowLikelyHigh,
  looseVolumeM3: z.number(),
  code: z.string(),
  /** Codes that may apply instead; a question, never a decision. */
  alternatives: z.array(z.string()),
  /** A suspicion of this building touches the material. */
  mustAsk: z.boolean(),
})
export type InventoryLine = z.infer<typeof inventoryLine>

/** Something to have sampled; having none is never "free of". */
export const inventorySuspicion = z.object({
  substance: z.string(),
  element: z.string(),
  code: z.string(),
  because: z.enum(['built-then', 'refurbished-then', 'may-have-been-added', 'year-unknown']),
  source: z.string(),
  provenance: z.enum(PROVENANCES),
})
export type InventorySuspicion = z.infer<typeof inventorySuspicion>

/** What one building is made of, as it was when it was listed. */
export const inventory = z.object({
  use: z.enum([...USES, 'unknown']),
  structure: z.enum([...STRUCTURES, 'unknown']),
  yearFrom: calendarYear.nullable(),
  yearTo: calendarYear.nullable(),
  footprintM2: z.number(),
  grossFloorAreaM2: z.number(),
  lines: z.array(inventoryLine),
  suspicions: z.array(inventorySuspicion),
})
export type Inventory = z.infer<typeof inventory>

/** A building with a known day of demolition, shown to chosen contractors. */
export const listing = z.object({
  listingId: id,
  buildingId: id,
  label: z.string(),
  districtName: z.string(),
  runNumber: z.number().int(),
  editionNumber: z.number().int(),
  comesDownOn: calendarDay,
  note: z.string().nullable(),
  massKg: z.number(),
  listedByName: z.string(),
  listedAt: moment,
  withdrawnAt: moment.nullable(),
  withdrawalReason: z.string().nullable(),
  recipients: z.array(z.object({ personId: id, name: z.string(), firm: z.string().nullable() })),
})
export type Listing = z.infer<typeof listing>

/** One code: what was expected, and what the weighbridge said. */
export const codeComparison = z.object({
  code: z.string(),
  text: z.string(),
  expectedKg: lowLikelyHigh,
  weighedKg: z.number().nullable(),
  tickets: z.number().int(),
})
export type CodeComparison = z.infer<typeof codeComparison>

export const listingPage = listing.extend({
  inventory,
  findings: z.array(z.object({ findingId: id, byName: z.string(), at: moment, text: z.string() })),
  comparison: z.array(codeComparison),
})
export type ListingPage = z.infer<typeof listingPage>
