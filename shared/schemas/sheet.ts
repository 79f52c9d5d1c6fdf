import { z } from 'zod'
import { STRUCTURES, USES } from '@/shared/compute/factors/vocabulary'
import { calendarYear, id, moment, shareOfOne, typedText } from './primitives'

/** How an answer is known; the way sets its default error. */
export const KNOWN_BY = ['seen', 'measured', 'register', 'told', 'guessed'] as const
export const knownBy = z.enum(KNOWN_BY)
export type KnownBy = z.infer<typeof knownBy>

export const useOrUnknown = z.enum([...USES, 'unknown'])
export const structureOrUnknown = z.enum([...STRUCTURES, 'unknown'])

export const CONDITIONS = ['good', 'fair', 'poor', 'ruinous', 'unknown'] as const
export const VACANCIES = ['occupied', 'partly-vacant', 'vacant', 'unknown'] as const

const storeysAboveGround = z
  .number()
  .min(0.5)
  .max(150)
  .refine((storeys) => Number.isInteger(storeys * 2), { error: 'storeys come in halves' })

const exactYear = z.object({ kind: z.literal('exact'), year: calendarYear, knownBy })
const yearRange = z.object({ kind: z.literal('between'), fromYear: calendarYear, toYear: calendarYear, knownBy })
const unknownYear = z.object({ kind: z.literal('unknown') })

export const constructionYear = z
  .discriminatedUnion('kind', [exactYear, yearRange, unknownYear])
  .refine((year) => year.kind !== 'between' || year.fromYear <= year.toYear, {
    error: 'the first year must not be after the last',
    path: ['fromYear'],
  })
export type ConstructionYear = z.infer<typeof constructionYear>

/** What the surveyor found at the place: a standing building, or why there is nothing to record. */
export const finding = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('standing') }),
  z.object({ kind: z.literal('inaccessible') }),
  z.object({ kind: z.literal('not-a-building') }),
  z.object({ kind: z.literal('cleared'), clearedYear: calendarYear.nullable() }),
])

/**
 * The field groups of a sheet. Each group merges as one value and carries how it is known.
 * A group that is absent has not been answered; an answer "not known" is a value of its own.
 */
export const sheetGroups = {
  finding,
  position: z.object({
    longitude: z.number().min(-180).max(180),
    latitude: z.number().min(-90).max(90),
    accuracyM: z.number().min(0).max(100_000),
  }),
  use: z.object({ use: useOrUnknown, knownBy: knownBy.optional() }),
  structure: z.object({ structure: structureOrUnknown, knownBy: knownBy.optional() }),
  storeys: z.object({ aboveGround: storeysAboveGround.nullable(), knownBy: knownBy.optional() }),
  footprint: z.object({ footprintM2: z.number().positive().max(2_000_000), knownBy }),
  attic: z.object({ floorShare: shareOfOne.nullable(), knownBy: knownBy.optional() }),
  basement: z.object({ floorShare: shareOfOne.nullable(), knownBy: knownBy.optional() }),
  constructionYear,
  condition: z.object({ condition: z.enum(CONDITIONS), knownBy: knownBy.optional() }),
  vacancy: z.object({ vacancy: z.enum(VACANCIES), knownBy: knownBy.optional() }),
  protection: z.object({ isProtected: z.boolean(), knownBy: knownBy.optional() }),
  suspicions: z.object({ seen: z.array(z.string().max(120)).max(30) }),
  notes: z.object({ text: typedText(4_000) }),
} as const

export const SHEET_GROUPS = Object.keys(sheetGroups) as SheetGroup[]
export type SheetGroup = keyof typeof sheetGroups

/** All answers of a sheet; every group may still be missing. */
export const sheetAnswers = z.strictObject(sheetGroups).partial()
export type SheetAnswers = z.infer<typeof sheetAnswers>

/** State on the server. `started` and `in the bag` exist on the device only. */
export const SHEET_STATES = ['handed-in', 'checked', 'sent-back'] as const
export const sheetState = z.enum(SHEET_STATES)
export type SheetState = z.infer<typeof sheetState>

export const DEVICE_SHEET_STATES = ['to-do', 'started', 'in-the-bag', ...SHEET_STATES] as const
export type DeviceSheetState = (typeof DEVICE_SHEET_STATES)[number]

/** The planner's word on a sheet. */
export const sheetReview = z.object({
  state: sheetState,
  question: z.string().nullable(),
  reviewedByName: z.string().nullable(),
  reviewedAt: moment.nullable(),
})
export type SheetReview = z.infer<typeof sheetReview>

/** The least a sheet needs before it may go in the bag: what was found, and if standing its use, structure, storeys, footprint and year, each answered or said not known. */
export const sheetReadyForBag = sheetAnswers.superRefine((answers, context) => {
  if (!answers.finding) context.addIssue({ code: 'custom', path: ['finding'], message: 'not-answered' })
  if (answers.finding && answers.finding.kind !== 'standing') return
  for (const group of ['use', 'structure', 'storeys', 'footprint', 'constructionYear'] as const) {
    if (!answers[group]) context.addIssue({ code: 'custom', path: [group], message: 'not-answered' })
  }
})

export const PHOTO_TAGS = ['street-front', 'rear', 'roof', 'detail', 'hazard-sign'] as const
export const photoTag = z.enum(PHOTO_TAGS)

export const PHOTO_STATES = ['declared', 'partial', 'stored', 'refused'] as const
export const photoMeta = z.object({
  photoId: id,
  sheetId: id,
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
  bytes: z.number().int().positive().max(12_000_000),
  mime: z.enum(['image/jpeg', 'image/webp', 'image/png']),
  widthPx: z.number().int().positive().max(10_000),
  heightPx: z.number().int().positive().max(10_000),
  tag: photoTag,
  takenAt: moment.nullable(),
})
export type PhotoMeta = z.infer<typeof photoMeta>

/** Revision number 1, 2, 3 … as the letter of a drawing sheet: A, B, … Z, AA. */
export function revisionLetter(revision: number): string {
  let letters = ''
  for (let rest = revision; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters
  }
  return letters
}
