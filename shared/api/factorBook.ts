import { z } from 'zod'
import { FACTOR_PARTS } from '@/shared/factorBook/factorColumns'
import { edition, fullEdition } from '@/shared/schemas/factorBook'
import { id, typedText } from '@/shared/schemas/primitives'
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

const ofEdition = z.object({ editionId: id })

export const draftEdition = defineEndpoint({
  method: 'POST',
  path: '/factor-book/editions',
  audience: ['planner'],
  summary: 'Make a draft: a copy of an edition, or of the published figures that ship with the product.',
  params: nothing,
  query: nothing,
  body: z.object({ name: typedText(120).min(1), from: z.union([z.literal('published'), id]) }),
  response: edition,
  status: 201,
})

export const discardEdition = defineEndpoint({
  method: 'DELETE',
  path: '/factor-book/editions/:editionId',
  audience: ['planner'],
  summary: 'Delete a draft with its rows; an issued edition stays.',
  params: ofEdition,
  query: nothing,
  body: nothing,
  response: nothing,
})

export const issueEdition = defineEndpoint({
  method: 'POST',
  path: '/factor-book/editions/:editionId/issue',
  audience: ['planner'],
  summary: 'Issue a draft under a number higher than that of every issued edition; it never changes afterwards.',
  params: ofEdition,
  query: nothing,
  body: z.object({ number: z.number().int().min(1).max(100_000), note: typedText(2_000).min(1) }),
  response: edition,
})

/** The row is judged by the rules of its table, so that each fault has its own sentence at its field. */
const rowBody = z.record(z.string().max(40), z.union([z.string().max(4_000), z.number(), z.boolean(), z.null()]))

export const addFactorRow = defineEndpoint({
  method: 'POST',
  path: '/factor-book/editions/:editionId/:part/rows',
  audience: ['planner'],
  summary: 'Add a row to a table of a draft.',
  params: ofEdition.extend({ part: z.enum(FACTOR_PARTS) }),
  query: nothing,
  body: rowBody,
  response: z.object({ rowId: id }),
  status: 201,
})

export const changeFactorRow = defineEndpoint({
  method: 'PUT',
  path: '/factor-book/editions/:editionId/:part/rows/:rowId',
  audience: ['planner'],
  summary: 'Replace a row of a draft.',
  params: ofEdition.extend({ part: z.enum(FACTOR_PARTS), rowId: id }),
  query: nothing,
  body: rowBody,
  response: z.object({ rowId: id }),
})

export const removeFactorRow = defineEndpoint({
  method: 'DELETE',
  path: '/factor-book/editions/:editionId/rows/:rowId',
  audience: ['planner'],
  summary: 'Take a row out of a draft.',
  params: ofEdition.extend({ rowId: id }),
  query: nothing,
  body: nothing,
  response: nothing,
})
