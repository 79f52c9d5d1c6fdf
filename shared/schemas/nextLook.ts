import { z } from 'zod'
import { MATERIALS, USES } from '@/shared/compute/factors/vocabulary'
import { LOOK_ATTRIBUTES } from '@/shared/compute/nextLook/nextLook.types'
import { calendarYear, id, moment } from './primitives'
import { SHEET_STATES } from './sheet'

/** The figure that looks are to make surer. */
export const lookFigure = z.object({
  material: z.enum([...MATERIALS, 'all']),
  /** Last year of the demolition that counts; null: what stands today. */
  byYear: calendarYear.nullable(),
})
export type ChosenLookFigure = z.infer<typeof lookFigure>

/** What is asked as long as nobody has chosen: everything that stands today. */
export const FIRST_LOOK_FIGURE: ChosenLookFigure = { material: 'all', byYear: null }

export const lookReason = z.object({ narrows: z.enum(LOOK_ATTRIBUTES), isLarge: z.boolean() })

/** A building worth a look. */
export const rankedLook = z.object({
  buildingId: id,
  outlineId: id,
  beatId: id.nullable(),
  label: z.string(),
  /** Not recorded yet, or in what state its sheet is. */
  state: z.enum(['to-do', ...SHEET_STATES]),
  /** Of the sheet or the register. */
  use: z.enum([...USES, 'unknown']),
  floorAreaM2: z.number(),
  meanKg: z.number(),
  /** Expected fall of the variance of the figure [kg²]. */
  fallKg2: z.number(),
  /** Of the whole variance, and of what all looks of the list settle together [–]. */
  fallShare: z.number(),
  settleShare: z.number(),
  /** Expected fall if one attribute alone were known [kg²]. */
  byAttributeKg2: z.record(z.enum(LOOK_ATTRIBUTES), z.number()),
  reason: lookReason,
})
export type RankedLook = z.infer<typeof rankedLook>

/** The ranking of one round as a phone keeps it: only its own buildings, the most telling first. */
export const deviceLooks = z.object({
  roundId: id,
  figure: lookFigure,
  runNumber: z.number().int(),
  rankedAt: moment,
  /** Looks in the whole round. */
  roundCount: z.number().int(),
  looks: z.array(
    z.object({
      buildingId: id,
      /** Place in the list of the whole round, from 1. */
      rank: z.number().int(),
      /** Of what all looks of the round settle together [–]. */
      settleShare: z.number(),
      reason: lookReason,
      /** It had a sheet when the list was made: looked at, and still in doubt. */
      isRecorded: z.boolean(),
    }),
  ),
})
export const deviceLooksList = z.array(deviceLooks)
export type DeviceLook = DeviceLooks['looks'][number]
export type DeviceLooks = z.infer<typeof deviceLooks>
