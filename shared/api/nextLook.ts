import { z } from 'zod'
import { deviceLooksList, lookFigure, rankedLook } from '@/shared/schemas/nextLook'
import { calendarYear, id } from '@/shared/schemas/primitives'
import { varianceShares } from '@/shared/schemas/run'
import { defineEndpoint, nothing } from './defineEndpoint'

const roundId = z.object({ roundId: id })

export const nextLooks = z.object({
  figure: lookFigure,
  /** The figure that phones are told of. */
  chosenFigure: lookFigure,
  surveyYear: calendarYear,
  /** The finished run whose edition and scenario the ranking rests on; of another round of the district while this one has none. */
  run: z.object({ runId: id, number: z.number().int(), editionNumber: z.number().int(), isOfRound: z.boolean() }),
  frameCount: z.number().int(),
  recordedCount: z.number().int(),
  /** Over all buildings of the frame that stand, recorded or not. */
  meanKg: z.number(),
  varianceKg2: z.number(),
  varianceShares,
  beats: z.array(z.object({ beatId: id, name: z.string() })),
  looks: z.array(rankedLook),
})
export type NextLooksReply = z.infer<typeof nextLooks>

export const readNextLook = defineEndpoint({
  method: 'GET',
  path: '/rounds/:roundId/next-look',
  audience: ['planner'],
  summary:
    'Buildings of a round in the order in which looking at them makes a figure surer; without a figure, the chosen one.',
  params: roundId,
  query: z.object({
    material: lookFigure.shape.material.optional(),
    byYear: z.coerce.number().pipe(calendarYear).optional(),
  }),
  body: nothing,
  response: nextLooks,
})

export const chooseLookFigure = defineEndpoint({
  method: 'PUT',
  path: '/rounds/:roundId/look-figure',
  audience: ['planner'],
  summary: 'Choose the figure that the phones of a round are to make surer.',
  params: roundId,
  query: nothing,
  body: lookFigure,
  response: lookFigure,
})

export const readDeviceLooks = defineEndpoint({
  method: 'GET',
  path: '/sync/next-look',
  audience: ['surveyor'],
  summary: 'Where to look next on my beats, by round; a round without a finished run is not on it.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ rounds: deviceLooksList }),
})
