import { z } from 'zod'
import { outline } from '@/shared/schemas/outline'
import { areaGeometry, id, moment, typedText } from '@/shared/schemas/primitives'
import { photoMeta, PHOTO_STATES, sheetAnswers, sheetReview, sheetState } from '@/shared/schemas/sheet'
import { conflictEntity } from '@/shared/schemas/sync'
import { defineEndpoint, nothing } from './defineEndpoint'

export const FLAGS = [
  'photo-missing',
  'far-from-outline',
  'position-doubtful',
  'area-out-of-range',
  'storeys-out-of-range',
  'year-contradicts-register',
  'storeys-contradict-height',
  'conflict-open',
  'much-not-known',
  'not-confirmed',
] as const
export const flag = z.enum(FLAGS)
export type Flag = z.infer<typeof flag>

export const queueEntry = z.object({
  sheetId: id,
  outlineId: id.nullable(),
  reference: z.string(),
  label: z.string(),
  state: sheetState,
  revision: z.number().int(),
  /** Change number as it was read; accepting names it, so that nothing unseen is accepted. */
  change: z.number().int(),
  flags: z.array(flag),
  recordedByName: z.string(),
  recordedAt: moment,
  grossFloorAreaM2: z.number().nullable(),
  photoCount: z.number().int(),
})
export type QueueEntry = z.infer<typeof queueEntry>

export const reviewSheet = queueEntry.extend({
  roundId: id,
  outline: outline.nullable(),
  geometry: areaGeometry.nullable(),
  answers: sheetAnswers,
  review: sheetReview,
  photos: z.array(photoMeta.extend({ state: z.enum(PHOTO_STATES) })),
  conflicts: z.array(conflictEntity.extend({ conflictId: id })),
  revisions: z.array(
    z.object({ revision: z.number().int(), state: sheetState, byName: z.string(), at: moment, answers: sheetAnswers }),
  ),
})
export type ReviewSheet = z.infer<typeof reviewSheet>

const sheetParams = z.object({ sheetId: id })

export const reviewQueue = defineEndpoint({
  method: 'GET',
  path: '/review/queue',
  audience: ['planner'],
  summary: 'Sheets of a round for review, flags first.',
  params: nothing,
  query: z.object({
    roundId: id.optional(),
    state: sheetState.optional(),
    limit: z.coerce.number().int().min(1).max(5_000).default(500),
  }),
  body: nothing,
  response: z.object({
    sheets: z.array(queueEntry),
    counts: z.object({ handedIn: z.number().int(), checked: z.number().int(), sentBack: z.number().int() }),
  }),
})

export const readSheet = defineEndpoint({
  method: 'GET',
  path: '/sheets/:sheetId',
  audience: ['planner'],
  summary: 'One sheet with photos, conflicts and revisions.',
  params: sheetParams,
  query: nothing,
  body: nothing,
  response: reviewSheet,
})

export const checkSheets = defineEndpoint({
  method: 'POST',
  path: '/review/check',
  audience: ['planner'],
  summary: 'Accept sheets as they were seen; one that changed meanwhile is left and named.',
  params: nothing,
  query: nothing,
  body: z.object({
    sheets: z
      .array(z.object({ sheetId: id, change: z.number().int() }))
      .min(1)
      .max(5_000),
  }),
  response: z.object({ checkedIds: z.array(id), changedMeanwhileIds: z.array(id) }),
})

export const sendBackSheet = defineEndpoint({
  method: 'POST',
  path: '/sheets/:sheetId/send-back',
  audience: ['planner'],
  summary: 'Return a sheet to its surveyor with a question.',
  params: sheetParams,
  query: nothing,
  body: z.object({ question: typedText(500).min(1), change: z.number().int() }),
  response: reviewSheet,
})

export const settleConflict = defineEndpoint({
  method: 'POST',
  path: '/conflicts/:conflictId/settle',
  audience: ['planner'],
  summary: 'Choose the value of a conflict.',
  params: z.object({ conflictId: id }),
  query: nothing,
  body: z.object({ choice: z.enum(['kept', 'set-aside']) }),
  response: reviewSheet,
})
