import { z } from 'zod'
import { MATERIALS, STRUCTURES, USES } from '@/shared/compute/factors/vocabulary'
import { LIFETIME_MODELS } from './factorBook'
import { calendarYear, id, moment, typedText } from './primitives'

/** Parameters of a scenario; a result stores them all. */
export const scenario = z.object({
  name: typedText(120).min(1),
  /** Years of flow to compute. */
  horizonYears: z.number().int().min(1).max(200).default(100),
  /** Age at the end of the construction year: 1 start, 0.5 mid-year, 0 end of year. */
  yearOffset: z.union([z.literal(0), z.literal(0.5), z.literal(1)]).default(0.5),
  /** Condition, vacancy and protection act on the hazard. */
  appliesHazardMultipliers: z.boolean().default(true),
  /** Calibration multiplier m on the hazard of every building. */
  hazardMultiplier: z.number().min(0.05).max(20).default(1),
  /** Lifetimes that replace those of the edition, by use. */
  lifetimeOverrides: z
    .array(
      z.object({
        use: z.enum([...USES, 'all']),
        model: z.enum(LIFETIME_MODELS),
        meanYears: z.number().positive().max(1_000),
        sdYears: z.number().nonnegative().max(1_000),
      }),
    )
    .max(50)
    .default([]),
})
export type Scenario = z.infer<typeof scenario>

/** Mean and quantiles of a mass; the band is P10 to P90. */
export const massBand = z.object({
  meanKg: z.number(),
  p10Kg: z.number(),
  p50Kg: z.number(),
  p90Kg: z.number(),
})
export type MassBand = z.infer<typeof massBand>

export const material = z.enum(MATERIALS)

/** Series by year, each list as long as `years`. */
export const bandSeries = z.object({
  meanKg: z.array(z.number()),
  p10Kg: z.array(z.number()),
  p90Kg: z.array(z.number()),
})
export type BandSeries = z.infer<typeof bandSeries>

export const varianceShares = z.object({
  measurement: z.number(),
  factor: z.number(),
  lifetime: z.number(),
  chance: z.number(),
})

export const RUN_STATES = ['queued', 'running', 'done', 'failed', 'cancelled'] as const

export const runSummary = z.object({
  runId: id,
  number: z.number().int(),
  state: z.enum(RUN_STATES),
  progressShare: z.number().min(0).max(1),
  /** Why it failed, in words. */
  failure: z.string().nullable(),
  roundId: id,
  roundName: z.string(),
  districtId: id,
  districtName: z.string(),
  editionId: id,
  editionNumber: z.number().int(),
  scenario,
  surveyYear: calendarYear,
  engineVersion: z.string(),
  seed: z.number().int(),
  /** SHA-256 of the canonical inputs: equal digests mean equal results. */
  inputsSha256: z.string().nullable(),
  resultSha256: z.string().nullable(),
  createdAt: moment,
  createdByName: z.string(),
})
export type RunSummary = z.infer<typeof runSummary>

/** What a reader must be told beside every figure. */
export const runBasis = z.object({
  areaBasis: z.literal('GFA'),
  /** Buildings in the frame, and how many were computed. The rest is shown, never counted as zero. */
  frameCount: z.number().int(),
  computedCount: z.number().int(),
  inaccessibleCount: z.number().int(),
  notABuildingCount: z.number().int(),
  clearedCount: z.number().int(),
  outstandingCount: z.number().int(),
  frameFootprintM2: z.number(),
  computedFootprintM2: z.number(),
  computedFloorAreaM2: z.number(),
  unknownUseCount: z.number().int(),
  unknownStructureCount: z.number().int(),
  unknownYearCount: z.number().int(),
  unknownStoreysCount: z.number().int(),
  /** Buildings older than their model lets them be: all leave in the first year. */
  overdueCount: z.number().int(),
  /** First-year expected flow over standing floor area. */
  impliedDemolitionRatePerYear: z.number(),
  /** Set when the rate is outside 0.001–0.01 a year. */
  impliedRateWarning: z.enum(['below-band', 'above-band']).nullable(),
  varianceSharesOfStock: varianceShares,
  varianceSharesOfTenYearFlow: varianceShares,
})
export type RunBasis = z.infer<typeof runBasis>

export const stockCell = z.object({
  use: z.enum([...USES, 'unknown']),
  structure: z.enum([...STRUCTURES, 'unknown']),
  /** Period id of the vocabulary or `unknown`. */
  period: z.string(),
  buildingCount: z.number().int(),
  floorAreaM2: z.number(),
  /** Mean mass by material; a material whose factor is missing is absent, not zero. */
  massKg: z.partialRecord(material, z.number()),
})
export type StockCell = z.infer<typeof stockCell>

export const runResult = z.object({
  basis: runBasis,
  stock: z.object({
    total: massBand,
    byMaterial: z.array(
      z.object({
        material,
        band: massBand,
        /** Buildings whose factor for this material is missing. */
        missingCount: z.number().int(),
        /** Rows of the factor book the figure rests on. */
        factorRowIds: z.array(id),
        isFromMemory: z.boolean(),
      }),
    ),
    cells: z.array(stockCell),
  }),
  yearsAhead: z.object({
    years: z.array(calendarYear),
    demolition: z.object({ total: bandSeries, byMaterial: z.partialRecord(material, bandSeries) }),
    /** Empty where the factors are not split by component. */
    refurbishment: z.object({ total: bandSeries, byMaterial: z.partialRecord(material, bandSeries) }),
    /** Expected number of buildings and floor area that come down, by year. */
    expectedBuildings: z.array(z.number()),
    expectedFloorAreaM2: z.array(z.number()),
    /** Cumulative demolition of all materials up to each year. */
    cumulative: bandSeries,
  }),
})
export type RunResult = z.infer<typeof runResult>

/** One building's part of a run: what the map shows and where a receipt ends. */
export const runBuilding = z.object({
  buildingId: id,
  outlineId: id.nullable(),
  blockId: id.nullable(),
  label: z.string(),
  use: z.enum([...USES, 'unknown']),
  structure: z.enum([...STRUCTURES, 'unknown']),
  yearFrom: calendarYear.nullable(),
  yearTo: calendarYear.nullable(),
  footprintM2: z.number(),
  grossFloorAreaM2: z.number(),
  floorAreaCv: z.number(),
  massKg: z.number(),
  massByMaterialKg: z.partialRecord(material, z.number()),
  /** Chance to come down within the horizon's first ten and thirty years. */
  chanceTenYears: z.number(),
  chanceThirtyYears: z.number(),
})
export type RunBuilding = z.infer<typeof runBuilding>
