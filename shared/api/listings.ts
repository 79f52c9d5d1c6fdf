import { z } from 'zod'
import { listing, listingPage } from '@/shared/schemas/listing'
import { calendarDay, id, typedText } from '@/shared/schemas/primitives'
import { defineEndpoint, nothing } from './defineEndpoint'

const listingParams = z.object({ listingId: id })

export const listListings = defineEndpoint({
  method: 'GET',
  path: '/listings',
  audience: ['planner'],
  summary: 'Buildings listed with a known day of demolition.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ listings: z.array(listing) }),
})

export const listBuilding = defineEndpoint({
  method: 'POST',
  path: '/listings',
  audience: ['planner'],
  summary: 'List one building of a finished run with its day of demolition; its inventory is frozen.',
  params: nothing,
  query: nothing,
  body: z.object({
    runId: id,
    buildingId: id,
    comesDownOn: calendarDay,
    note: typedText(500).nullable(),
    recipientIds: z.array(id).min(1).max(500),
  }),
  response: listingPage,
  status: 201,
})

export const readListing = defineEndpoint({
  method: 'GET',
  path: '/listings/:listingId',
  audience: ['planner'],
  summary: 'One listed building with what contractors found and weighed.',
  params: listingParams,
  query: nothing,
  body: nothing,
  response: listingPage,
})

export const withdrawListing = defineEndpoint({
  method: 'POST',
  path: '/listings/:listingId/withdraw',
  audience: ['planner'],
  summary: 'Take a listed building back, with a reason that its readers see.',
  params: listingParams,
  query: nothing,
  body: z.object({ reason: typedText(500).min(1) }),
  response: listingPage,
})

export const listYardListings = defineEndpoint({
  method: 'GET',
  path: '/yard/listings',
  audience: ['contractor'],
  summary: 'Buildings listed to me.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ listings: z.array(listing) }),
})

export const readYardListing = defineEndpoint({
  method: 'GET',
  path: '/yard/listings/:listingId',
  audience: ['contractor'],
  summary: 'The inventory of a building listed to me, with my own findings and tickets.',
  params: listingParams,
  query: nothing,
  body: nothing,
  response: listingPage,
})

export const addFinding = defineEndpoint({
  method: 'POST',
  path: '/yard/listings/:listingId/findings',
  audience: ['contractor'],
  summary: 'Note what I found on site; the planner sees it, other contractors do not.',
  params: listingParams,
  query: nothing,
  body: z.object({ text: typedText(1_000).min(1) }),
  response: listingPage,
  status: 201,
})

export const giveTickets = defineEndpoint({
  method: 'PUT',
  path: '/yard/listings/:listingId/tickets',
  audience: ['contractor'],
  summary: 'Give the weighbridge tickets as CSV (date, waste_code, mass_t): all rows or none; they replace mine.',
  params: listingParams,
  query: nothing,
  body: z.object({ csv: z.string().min(1).max(1_000_000) }),
  response: listingPage,
})
