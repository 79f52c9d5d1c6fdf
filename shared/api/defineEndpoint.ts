import { z } from 'zod'
import type { Role } from '@/shared/schemas/person'

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'

/** Who may call: anybody, any signed-in person, or people with one of the roles. */
export type Audience = 'public' | 'signed-in' | readonly Role[]

/** One endpoint of the contract: it serves the server, the device and the tests. */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  readonly method: Method
  /** Below `/api/v1`, with `:name` for parameters. */
  readonly path: `/${string}`
  readonly audience: Audience
  readonly summary: string
  readonly params: Params
  readonly query: Query
  readonly body: Body
  readonly response: Response
  /** Status of success; 200 when absent. */
  readonly status?: number
}

export type EndpointInput<E extends Endpoint> = {
  params: z.input<E['params']>
  query: z.input<E['query']>
  body: z.input<E['body']>
}
export type EndpointParsed<E extends Endpoint> = {
  params: z.output<E['params']>
  query: z.output<E['query']>
  body: z.output<E['body']>
}
export type EndpointReply<E extends Endpoint> = z.output<E['response']>

export const nothing = z.object({}).strict()

/** Freezes an endpoint and keeps its types. */
export function defineEndpoint<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Response extends z.ZodType,
>(endpoint: Endpoint<Params, Query, Body, Response>): Endpoint<Params, Query, Body, Response> {
  return Object.freeze(endpoint)
}

export const API_PREFIX = '/api/v1'
