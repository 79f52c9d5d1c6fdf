import { z } from 'zod'
import { defineEndpoint, nothing } from './defineEndpoint'

export const readHealth = defineEndpoint({
  method: 'GET',
  path: '/health',
  audience: 'public',
  summary: 'The process is up.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ status: z.literal('up'), version: z.string() }),
})

export const readReadiness = defineEndpoint({
  method: 'GET',
  path: '/ready',
  audience: 'public',
  summary: 'Database, migrations and queue answer; 503 with the one that does not.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({ database: z.boolean(), migrations: z.boolean(), queue: z.boolean() }),
})
