import { z } from 'zod'
import { defineEndpoint, nothing } from './defineEndpoint'

export const readOpenApi = defineEndpoint({
  method: 'GET',
  path: '/openapi.json',
  audience: 'public',
  summary: 'Every endpoint of the contract as an OpenAPI 3.1 document.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z
    .object({
      openapi: z.literal('3.1.0'),
      info: z.object({ title: z.string(), version: z.string(), description: z.string() }),
      paths: z.record(z.string(), z.record(z.string(), z.unknown())),
    })
    .loose(),
})
