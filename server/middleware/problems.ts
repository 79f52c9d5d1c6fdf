import type { ErrorRequestHandler, RequestHandler } from 'express'
import type { Logger } from 'pino'
import { notFound, Refusal, toProblem } from '@/server/errors'
import { describeFault } from './describeFault'

/** Every unknown address below the API is one problem. */
export const unknownAddress: RequestHandler = (_request, _response, next) => next(notFound('address'))

/** Refusals that a steward may want to see in the log: who may not, and too often. */
const WATCHED: ReadonlySet<number> = new Set([401, 403, 429])

/**
 * Last stop of every error: one problem+json, without stack, SQL or path. Only faults of ours are logged as errors;
 * refusals of access are noted by code and request, never with what was sent.
 */
export function answerProblem(log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) return next(error)
    const refusal = asRefusal(error)
    if (refusal.status >= 500)
      log.error({ requestId: request.requestId, fault: describeFault(error) }, 'request failed')
    if (WATCHED.has(refusal.status)) log.info({ requestId: request.requestId, code: refusal.code }, 'access refused')
    response
      .status(refusal.status)
      .set(refusal.headers)
      .type('application/problem+json')
      .send(JSON.stringify(toProblem(refusal, request.requestId)))
  }
}

function asRefusal(error: unknown): Refusal {
  if (error instanceof Refusal) return error
  const { type, status } = (typeof error === 'object' && error !== null ? error : {}) as {
    type?: string
    status?: number
  }
  if (type === 'entity.too.large')
    return new Refusal(
      413,
      'body-too-large',
      'The request is larger than the server takes. Nothing was changed; send less at once.',
    )
  if (type === 'entity.parse.failed')
    return new Refusal(400, 'body-not-readable', 'The body is not JSON that can be read. Nothing was changed.')
  if (status !== undefined && status >= 400 && status < 500)
    return new Refusal(status, 'request-refused', 'The request cannot be read. Nothing was changed.')
  return new Refusal(
    500,
    'fault-of-ours',
    'The server failed at this. Nothing was changed; try again, and tell your steward the request number if it stays.',
  )
}
