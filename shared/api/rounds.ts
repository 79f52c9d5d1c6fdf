import { z } from 'zod'
import { calendarDay, id, typedText } from '@/shared/schemas/primitives'
import { defineEndpoint, nothing } from './defineEndpoint'

/** How far a round or beat has come, by buildings. The parts add up to `buildingCount`. */
export const coverage = z.object({
  buildingCount: z.number().int(),
  toDoCount: z.number().int(),
  handedInCount: z.number().int(),
  checkedCount: z.number().int(),
  sentBackCount: z.number().int(),
})
export type Coverage = z.infer<typeof coverage>

export const beat = z.object({
  beatId: id,
  name: z.string(),
  surveyorId: id.nullable(),
  surveyorName: z.string().nullable(),
  coverage,
})
export type Beat = z.infer<typeof beat>

export const round = z.object({
  roundId: id,
  name: z.string(),
  districtId: id,
  districtName: z.string(),
  startsOn: calendarDay,
  endsOn: calendarDay,
  coverage,
  /** Share of the frame's footprint that is handed in or checked. */
  footprintShareRecorded: z.number(),
})
export type Round = z.infer<typeof round>

export const roundWithBeats = round.extend({
  beats: z.array(beat),
  /** Buildings of the frame, in no beat yet when `beatId` is null. */
  buildings: z.array(
    z.object({
      buildingId: id,
      outlineId: id,
      beatId: id.nullable(),
      state: z.enum(['to-do', 'handed-in', 'checked', 'sent-back']),
    }),
  ),
})
export type RoundWithBeats = z.infer<typeof roundWithBeats>

const roundId = z.object({ roundId: id })
const beatBody = z.object({
  name: typedText(80).min(1),
  surveyorId: id.nullable(),
  outlineIds: z.array(id).max(5_000),
})

export const listRounds = defineEndpoint({
  method: 'GET',
  path: '/rounds',
  audience: ['planner', 'steward'],
  summary: 'All rounds, newest first.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ rounds: z.array(round) }),
})

export const createRound = defineEndpoint({
  method: 'POST',
  path: '/rounds',
  audience: ['planner'],
  summary: 'Open a round over a district; its frame is all outlines of the district as they stand now.',
  params: nothing,
  query: nothing,
  body: z
    .object({ name: typedText(120).min(1), districtId: id, startsOn: calendarDay, endsOn: calendarDay })
    .refine((round) => round.startsOn <= round.endsOn, {
      error: 'a round cannot end before it starts',
      path: ['endsOn'],
    }),
  response: roundWithBeats,
  status: 201,
})

export const readRound = defineEndpoint({
  method: 'GET',
  path: '/rounds/:roundId',
  audience: ['planner', 'steward'],
  summary: 'One round with its beats and frame.',
  params: roundId,
  query: nothing,
  body: nothing,
  response: roundWithBeats,
})

export const createBeat = defineEndpoint({
  method: 'POST',
  path: '/rounds/:roundId/beats',
  audience: ['planner'],
  summary: 'Make a beat of outlines, for one surveyor. Outlines of another beat move over.',
  params: roundId,
  query: nothing,
  body: beatBody,
  response: roundWithBeats,
  status: 201,
})

export const shareOutBeats = defineEndpoint({
  method: 'POST',
  path: '/rounds/:roundId/share-out',
  audience: ['planner'],
  summary: 'Make several beats at once: all of them or, on any fault, none.',
  params: roundId,
  query: nothing,
  body: z.object({ beats: z.array(beatBody).min(1).max(60) }),
  response: roundWithBeats,
  status: 201,
})

export const changeBeat = defineEndpoint({
  method: 'PUT',
  path: '/rounds/:roundId/beats/:beatId',
  audience: ['planner'],
  summary: 'Rename a beat, give it to another surveyor, or change its outlines.',
  params: z.object({ roundId: id, beatId: id }),
  query: nothing,
  body: beatBody,
  response: roundWithBeats,
})

export const removeBeat = defineEndpoint({
  method: 'DELETE',
  path: '/rounds/:roundId/beats/:beatId',
  audience: ['planner'],
  summary: 'Dissolve a beat; its buildings are without a beat, recorded sheets stay.',
  params: z.object({ roundId: id, beatId: id }),
  query: nothing,
  body: nothing,
  response: roundWithBeats,
})
