import { z } from 'zod'
import { id, moment, typedText } from '@/shared/schemas/primitives'
import { material } from '@/shared/schemas/run'
import { defineEndpoint, nothing } from './defineEndpoint'

export const publication = z.object({
  publicationId: id,
  runId: id,
  runNumber: z.number().int(),
  title: z.string(),
  districtName: z.string(),
  roundName: z.string(),
  editionNumber: z.number().int(),
  surveyYear: z.number().int(),
  publishedByName: z.string(),
  publishedAt: moment,
  withdrawnAt: moment.nullable(),
  withdrawalReason: z.string().nullable(),
  recipients: z.array(z.object({ personId: id, name: z.string(), firm: z.string().nullable() })),
})
export type Publication = z.infer<typeof publication>

/** How a contractor carries waste away. */
export const fleet = z.object({
  containerM3: z.coerce.number().min(0.5).max(120).default(30),
  payloadT: z.coerce.number().min(0.1).max(60).default(13),
})

const lowLikelyHigh = z.object({ low: z.number(), likely: z.number(), high: z.number() })

/** One waste code in one year. */
export const wasteLine = z.object({
  year: z.number().int(),
  code: z.string(),
  text: z.string(),
  isHazardous: z.boolean(),
  /** Code that applies instead when testing finds hazardous substances; a question, never a decision. */
  mirrorHazardousCode: z.string().nullable(),
  materials: z.array(material),
  massKg: lowLikelyHigh,
  looseVolumeM3: lowLikelyHigh,
  loads: lowLikelyHigh,
})
export type WasteLine = z.infer<typeof wasteLine>

export const loadsAhead = z.object({
  publication,
  fleet,
  years: z.array(z.number().int()),
  lines: z.array(wasteLine),
  /** Materials without a bulk density or code: their mass is named, not hidden. */
  unassigned: z.array(z.object({ material, massKg: z.number() })),
  densities: z.array(
    z.object({
      code: z.string(),
      lowKgPerM3: z.number(),
      highKgPerM3: z.number(),
      source: z.string(),
      provenance: z.string(),
    }),
  ),
  basis: z.object({
    computedCount: z.number().int(),
    frameCount: z.number().int(),
    impliedDemolitionRatePerYear: z.number(),
    engineVersion: z.string(),
    yearOffset: z.number(),
  }),
})
export type LoadsAhead = z.infer<typeof loadsAhead>

export const listPublications = defineEndpoint({
  method: 'GET',
  path: '/publications',
  audience: ['planner'],
  summary: 'What was published, to whom, and what was withdrawn.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ publications: z.array(publication) }),
})

export const publishRun = defineEndpoint({
  method: 'POST',
  path: '/publications',
  audience: ['planner'],
  summary: 'Publish a finished run for the district as a whole to chosen contractors.',
  params: nothing,
  query: nothing,
  body: z.object({ runId: id, title: typedText(160).min(1), recipientIds: z.array(id).min(1).max(500) }),
  response: publication,
  status: 201,
})

export const withdrawPublication = defineEndpoint({
  method: 'POST',
  path: '/publications/:publicationId/withdraw',
  audience: ['planner'],
  summary: 'Take a publication back, with a reason that its readers see.',
  params: z.object({ publicationId: id }),
  query: nothing,
  body: z.object({ reason: typedText(500).min(1) }),
  response: publication,
})

export const listYardPublications = defineEndpoint({
  method: 'GET',
  path: '/yard/publications',
  audience: ['contractor'],
  summary: 'What was published to me.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ publications: z.array(publication) }),
})

export const readLoadsAhead = defineEndpoint({
  method: 'GET',
  path: '/yard/publications/:publicationId/loads',
  audience: ['contractor'],
  summary: 'Tonnes, loose cubic metres and loads by waste code and year.',
  params: z.object({ publicationId: id }),
  query: fleet,
  body: nothing,
  response: loadsAhead,
})
