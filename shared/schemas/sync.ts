import { z } from 'zod'
import { problem } from './problem'
import { outline } from './outline'
import { areaGeometry, id, moment } from './primitives'
import { photoMeta, PHOTO_STATES, sheetAnswers, sheetReview } from './sheet'

/** Version of the shapes on the wire. The server serves this one and two before it. */
export const SYNC_SCHEMA = 1

/** Most mutations in one push, and most changes in one page of a pull. */
export const PUSH_LIMIT = 500
export const PULL_LIMIT = 2_000

const mutationCore = {
  id,
  /** Gap-free number on this device, from 1. */
  seq: z.number().int().positive(),
  entity: id,
  /** Change number of the entity that was on screen when the surveyor wrote; 0 when made here. */
  seen: z.number().int().nonnegative(),
  /** Device clock and time since start, for people only; never for order. */
  at: z.string().max(40),
  elapsedMs: z.number().nonnegative(),
}

export const sheetMutation = z.strictObject({
  ...mutationCore,
  op: z.literal('set'),
  type: z.literal('sheet'),
  /** Building of the frame the sheet records; its id is the sheet's id too. */
  set: sheetAnswers,
})
export const photoMutation = z.strictObject({
  ...mutationCore,
  op: z.literal('set'),
  type: z.literal('photo'),
  set: photoMeta,
})
export const deleteMutation = z.strictObject({
  ...mutationCore,
  op: z.enum(['delete', 'undelete']),
  type: z.enum(['sheet', 'photo']),
})
export const resolveMutation = z.strictObject({
  ...mutationCore,
  op: z.literal('resolve'),
  type: z.literal('conflict'),
  set: z.object({ choice: z.enum(['kept', 'set-aside']) }),
})
export const mutation = z.union([sheetMutation, photoMutation, deleteMutation, resolveMutation])
export type Mutation = z.infer<typeof mutation>
export type SheetMutation = z.infer<typeof sheetMutation>
export type PhotoMutation = z.infer<typeof photoMutation>

export const MUTATION_STATUSES = ['applied', 'replay', 'rejected', 'blocked'] as const
export const mutationOutcome = z.object({
  id,
  seq: z.number().int(),
  status: z.enum(MUTATION_STATUSES),
  change: z.number().int().optional(),
  conflicts: z.array(id).optional(),
  problem: problem.optional(),
})
export type MutationOutcome = z.infer<typeof mutationOutcome>

/** A building of the frame, in the surveyor's beat. Its id is also the id of its sheet. */
export const buildingEntity = z.object({
  roundId: id,
  beatId: id,
  outline,
  geometry: areaGeometry,
})
export type BuildingEntity = z.infer<typeof buildingEntity>

export const sheetEntity = z.object({
  roundId: id,
  beatId: id.nullable(),
  answers: sheetAnswers,
  review: sheetReview,
  revision: z.number().int(),
  recordedByName: z.string(),
  recordedAt: moment,
})
export type SheetEntity = z.infer<typeof sheetEntity>

export const beatEntity = z.object({
  name: z.string(),
  roundId: id,
  roundName: z.string(),
  districtName: z.string(),
  startsOn: z.string(),
  endsOn: z.string(),
  buildingCount: z.number().int(),
})
export type BeatEntity = z.infer<typeof beatEntity>

export const photoEntity = photoMeta.extend({ state: z.enum(PHOTO_STATES), refusal: z.string().nullable() })
export type PhotoEntity = z.infer<typeof photoEntity>

export const conflictEntity = z.object({
  sheetId: id,
  group: z.string(),
  kept: z.unknown(),
  setAside: z.unknown(),
  keptByName: z.string(),
  setAsideByName: z.string(),
  state: z.enum(['open', 'settled']),
})
export type ConflictEntity = z.infer<typeof conflictEntity>

const changeCore = { id, change: z.number().int() }
/** One change of a pull page. `gone`: left this device's beats, or deleted; drop it. */
export const change = z.discriminatedUnion('type', [
  z.object({ ...changeCore, type: z.literal('beat'), fields: beatEntity }),
  z.object({ ...changeCore, type: z.literal('building'), fields: buildingEntity }),
  z.object({ ...changeCore, type: z.literal('sheet'), fields: sheetEntity }),
  z.object({ ...changeCore, type: z.literal('photo'), fields: photoEntity }),
  z.object({ ...changeCore, type: z.literal('conflict'), fields: conflictEntity }),
  z.object({ ...changeCore, type: z.literal('gone'), of: z.enum(['beat', 'building', 'sheet', 'photo', 'conflict']) }),
])
export type Change = z.infer<typeof change>
