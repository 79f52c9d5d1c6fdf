import { z } from 'zod'
import { id } from '@/shared/schemas/primitives'
import { runBuilding, runResult, runSummary, scenario } from '@/shared/schemas/run'
import { defineEndpoint, nothing } from './defineEndpoint'

const runParams = z.object({ runId: id })

export const listRuns = defineEndpoint({
  method: 'GET',
  path: '/runs',
  audience: ['planner'],
  summary: 'Runs, newest first.',
  params: nothing,
  query: z.object({ roundId: id.optional() }),
  body: nothing,
  response: z.object({ runs: z.array(runSummary) }),
})

export const startRun = defineEndpoint({
  method: 'POST',
  path: '/runs',
  audience: ['planner'],
  summary: 'Compute stock and years ahead from the checked sheets of a round, as they stand now.',
  params: nothing,
  query: nothing,
  body: z.object({
    roundId: id,
    editionId: id,
    scenario,
    seed: z.number().int().min(0).max(4_294_967_295).default(1),
  }),
  response: runSummary,
  status: 202,
})

export const readRun = defineEndpoint({
  method: 'GET',
  path: '/runs/:runId',
  audience: ['planner'],
  summary: 'A run with its result; the result is null until it is done.',
  params: runParams,
  query: nothing,
  body: nothing,
  response: runSummary.extend({ result: runResult.nullable() }),
})

export const readRunBuildings = defineEndpoint({
  method: 'GET',
  path: '/runs/:runId/buildings',
  audience: ['planner'],
  summary: 'Each building of a run: mass, floor area and chances.',
  params: runParams,
  query: nothing,
  body: nothing,
  response: z.object({ buildings: z.array(runBuilding) }),
})

export const cancelRun = defineEndpoint({
  method: 'POST',
  path: '/runs/:runId/cancel',
  audience: ['planner'],
  summary: 'Stop a run that is not done.',
  params: runParams,
  query: nothing,
  body: nothing,
  response: runSummary,
})
