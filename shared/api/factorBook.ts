import { z } from 'zod'
import { edition, fullEdition } from '@/shared/schemas/factorBook'
import { id } from '@/shared/schemas/primitives'
import { defineEndpoint, nothing } from './defineEndpoint'

export const listEditions = defineEndpoint({
  method: 'GET',
  path: '/factor-book/editions',
  audience: ['planner', 'steward'],
  summary: 'Editions of the factor book, newest first.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ editions: z.array(edition) }),
})

export const readEdition = defineEndpoint({
  method: 'GET',
  path: '/factor-book/editions/:editionId',
  audience: ['planner', 'steward'],
  summary: 'All rows of one edition with their sources.',
  params: z.object({ editionId: id }),
  query: nothing,
  body: nothing,
  response: fullEdition,
})
