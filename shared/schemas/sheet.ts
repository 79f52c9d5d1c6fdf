import { z } from 'zod'
import { COMPONENTS, STRUCTURES, USES } from '@/shared/compute/factors/vocabulary'
import { calendarYear, id, moment, shareOfOne, typedText } from './primitives'

/** How an answer is known; the way sets its default error. */
export const KNOWN_BY = ['seen', 'measured', 'register', 'told', 'guessed'] as const
export const knownBy = z.enum(KNOWN_BY)
export type KnownBy = z.infer<typeof knownBy>

/** Where an answer came from that nobody has confirmed yet by looking; absent once somebody has. */
export const UNCONFIRMED_FROM = ['register', 'same-as-last'] as const
export type UnconfirmedFrom = (typeof UNCONFIRMED_FROM)[number]
const unconfirmed = z.enum(UNCONFIRMED_FROM).optional()
const known = { knownBy: knownBy.optional(), unconfirmed }

export const useOrUnknown = z.enum([...USES, 'unknown'])
export const structureOrUnknown = z.enum([...STRUCTURES, 'unknown'])

export const CONDITIONS = ['good', 'fair', 'poor', 'ruinous', 'unknown'] as const
export const VACANCIES = ['occupied', 'partly-vacant', 'vacant', 'unknown'] as const
export const ROOF_FORMS = ['flat', 'gable', 'hip', 'mansard', 'mono-pitch', 'other', 'unknown'] as const
export const ROOF_COVERS = [
  'clay-tiles',
  'concrete-tiles',
  'slate',
  'fibre-cement',
  'metal',
  'bitumen',
  'thatch',
  'planted',
  'other',
  'unknown',
] as const
export const FACADES = [
  'bare-brick',
  'render',
  'insulated-render',
  'stone',
  'timber',
  'metal',
  'glass',
  'concrete',
  'tiles',
  'other',
  'unknown',
] as const
export const PERMIT_NOTICES = ['none', 'demolition', 'alteration', 'new-building', 'unknown'] as const

const storeysAboveGround = z
  .number()
  .min(0.5)
  .max(150)
  .refine((storeys) => Number.isInteger(storeys * 2), { error: 'storeys come in halves' })

const exactYear = z.object({ kind: z.literal('exact'), year: calendarYear, knownBy, unconfirmed })
const yearRange = z.object({
  kind: z.literal('between'),
  fromYear: calendarYear,
  toYear: calendarYear,
  knownBy,
  unconfirmed,
})
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
  z.object({ kind: z.literal('standing'), unconfirmed }),
  z.object({ kind: z.literal('inaccessible') }),
  z.object({ kind: z.literal('not-a-building') }),
  z.object({ kind: z.literal('cleared'), clearedYear: calendarYear.nullable() }),
])

/** A second use of one building; what the others leave is the main use's share. */
const otherUse = z.object({ use: z.enum(USES), share: shareOfOne.refine((share) => share > 0, { error: 'no share' }) })
export type OtherUse = z.infer<typeof otherUse>

export const MOST_OTHER_USES = 5
export const MOST_PARTS = 12
export const MOST_REFURBISHMENTS = 12

/** A part of a building with an age, a structure and a size of its own; the sheet's other answers are of the main part. */
const buildingPart = z.object({
  name: typedText(80),
  footprintM2: z.number().positive().max(2_000_000),
  aboveGround: storeysAboveGround.nullable(),
  /** Null: used as the main part is. */
  use: z.enum(USES).nullable(),
  structure: structureOrUnknown,
  constructionYear,
})
export type BuildingPart = z.infer<typeof buildingPart>

const refurbishment = z.object({ component: z.enum(COMPONENTS), year: constructionYear })
export type Refurbishment = z.infer<typeof refurbishment>

const heightM = z.number().min(0.5).max(900).nullable()

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
  use: z.object({
    use: useOrUnknown,
    otherUses: z
      .array(otherUse)
      .max(MOST_OTHER_USES)
      .refine((uses) => uses.reduce((sum, { share }) => sum + share, 0) < 1, { error: 'no share is left' })
      .optional(),
    ...known,
  }),
  structure: z.object({ structure: structureOrUnknown, ...known }),
  storeys: z.object({ aboveGround: storeysAboveGround.nullable(), ...known }),
  footprint: z.object({ footprintM2: z.number().positive().max(2_000_000), knownBy, unconfirmed }),
  attic: z.object({ floorShare: shareOfOne.nullable(), ...known }),
  basement: z.object({ floorShare: shareOfOne.nullable(), ...known }),
  constructionYear,
  condition: z.object({ condition: z.enum(CONDITIONS), ...known }),
  vacancy: z.object({ vacancy: z.enum(VACANCIES), ...known }),
  protection: z.object({ isProtected: z.boolean(), ...known }),
  parts: z.object({ parts: z.array(buildingPart).max(MOST_PARTS), knownBy: knownBy.optional() }),
  heights: z.object({ eavesM: heightM, ridgeM: heightM, storeyHeightM: heightM, ...known }),
  roof: z.object({ form: z.enum(ROOF_FORMS).nullable(), cover: z.enum(ROOF_COVERS).nullable(), ...known }),
  facade: z.object({ facade: z.enum(FACADES), ...known }),
  openings: z.object({ openingsShare: shareOfOne.nullable(), ...known }),
  refurbishments: z.object({ done: z.array(refurbishment).max(MOST_REFURBISHMENTS) }),
  permitNotice: z.object({ notice: z.enum(PERMIT_NOTICES), reference: typedText(120), ...known }),
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
  const partsM2 = (answers.parts?.parts ?? []).reduce((sum, { footprintM2 }) => sum + footprintM2, 0)
  if (answers.footprint && partsM2 > answers.footprint.footprintM2) {
    context.addIssue({ code: 'custom', path: ['parts'], message: 'larger-than-the-whole' })
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
