import type { NextFunction, Request, RequestHandler, Response, Router } from 'express'
import type { z } from 'zod'
import type { Endpoint, EndpointParsed, EndpointReply } from '@/shared/api/defineEndpoint'
import type { Fault } from '@/shared/schemas/problem'
import { forbidden, notSignedIn, unusable } from '@/server/errors'
import type { SignedIn } from '@/server/middleware/signedIn'

export interface HandlerInput<E extends Endpoint> extends EndpointParsed<E> {
  /** Set on every endpoint that is not public. */
  readonly signedIn: SignedIn
  readonly request: Request
  readonly response: Response
}

/** Reply of a handler: the wire shape, or `alreadySent` when it wrote bytes itself. */
export const alreadySent = Symbol('already sent')
type Reply<E extends Endpoint> = EndpointReply<E> | z.input<E['response']> | typeof alreadySent

/**
 * Puts an endpoint of the contract on a router: audience first, then params, query and body with all
 * their faults at once, then the handler, then the reply is checked against its own schema.
 *
 * @param before middlewares that must read the body themselves (multipart, raw bytes)
 */
export function mount<E extends Endpoint>(
  router: Router,
  endpoint: E,
  handler: (input: HandlerInput<E>) => Promise<Reply<E>>,
  before: readonly RequestHandler[] = [],
): void {
  const serve = async (request: Request, response: Response, next: NextFunction) => {
    try {
      const parsed = parseInput(endpoint, request)
      const reply = await handler({ ...parsed, signedIn: request.signedIn!, request, response })
      if (reply === alreadySent) return
      response.status(endpoint.status ?? 200).json(endpoint.response.parse(reply))
    } catch (error) {
      next(error)
    }
  }
  const path = endpoint.path
  const chain = [requireAudience(endpoint), ...before, serve]
  switch (endpoint.method) {
    case 'GET':
      return void router.get(path, ...chain)
    case 'POST':
      return void router.post(path, ...chain)
    case 'PUT':
      return void router.put(path, ...chain)
    case 'PATCH':
      return void router.patch(path, ...chain)
    case 'DELETE':
      return void router.delete(path, ...chain)
  }
}

function requireAudience(endpoint: Endpoint): RequestHandler {
  return (request, _response, next) => {
    if (endpoint.audience === 'public') return next()
    if (!request.signedIn) return next(notSignedIn())
    if (endpoint.audience === 'signed-in') return next()
    const roles = request.signedIn.roles
    if (endpoint.audience.some((role) => roles.includes(role))) return next()
    next(
      forbidden(
        `This needs the role ${endpoint.audience.join(' or ')}. Ask a steward of ${request.signedIn.organisationName}.`,
      ),
    )
  }
}

function parseInput<E extends Endpoint>(endpoint: E, request: Request): EndpointParsed<E> {
  const faults: Fault[] = []
  const read = (part: 'params' | 'query' | 'body', value: unknown) => {
    const result = endpoint[part].safeParse(value)
    if (!result.success) faults.push(...toFaults(part, result.error))
    return result.data
  }
  const parsed = {
    params: read('params', request.params),
    query: read('query', request.query),
    body: read('body', request.body ?? {}),
  }
  if (faults.length > 0) {
    throw unusable(
      `${faults.length === 1 ? 'One value' : `${faults.length} values`} cannot be used; nothing was changed.`,
      faults,
    )
  }
  return parsed as EndpointParsed<E>
}

/** All issues of a schema as faults with JSON pointers. */
export function toFaults(part: string, error: z.ZodError): Fault[] {
  return error.issues.map((issue) => ({
    pointer: `/${[part, ...issue.path.map((step) => String(step).replaceAll('~', '~0').replaceAll('/', '~1'))].join('/')}`,
    code: issue.code ?? 'invalid',
    detail: issue.message,
  }))
}
