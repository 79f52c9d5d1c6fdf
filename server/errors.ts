import type { Fault, Problem } from '@/shared/schemas/problem'

/** A refusal with a stable code. What is not a `Refusal` is a fault of ours and answered 500. */
export class Refusal extends Error {
  override readonly name = 'Refusal'

  constructor(
    readonly status: number,
    readonly code: string,
    /** What happened, what is safe, what to do. */
    readonly detail: string,
    readonly faults: readonly Fault[] = [],
    readonly headers: Readonly<Record<string, string>> = {},
    /** Number the server waits for, where the refusal is about a number. */
    readonly expected?: number,
  ) {
    super(`${status} ${code}`)
  }
}

export const notFound = (what: string) =>
  new Refusal(404, 'not-found', `There is no such ${what}, or it is not yours to see.`)
export const forbidden = (why: string) => new Refusal(403, 'forbidden', why)
export const notSignedIn = () =>
  new Refusal(401, 'not-signed-in', 'Sign in to go on. What is kept on this device is safe.')
export const conflictWith = (code: string, detail: string) => new Refusal(409, code, detail)
export const unusable = (detail: string, faults: readonly Fault[]) =>
  new Refusal(422, 'input-not-usable', detail, faults)

/** The wire shape of a refusal. */
export function toProblem(refusal: Refusal, requestId?: string): Problem {
  return {
    type: `urn:tallystone:problem:${refusal.code}`,
    title: TITLES[refusal.status] ?? 'Refused',
    status: refusal.status,
    code: refusal.code,
    detail: refusal.detail,
    faults: [...refusal.faults],
    ...(refusal.expected === undefined ? {} : { expected: refusal.expected }),
    ...(requestId === undefined ? {} : { requestId }),
  }
}

const TITLES: Readonly<Record<number, string>> = {
  400: 'The request cannot be read',
  401: 'Not signed in',
  403: 'Not allowed',
  404: 'Not found',
  409: 'It changed meanwhile',
  410: 'Start afresh',
  413: 'Too large',
  415: 'Wrong kind of content',
  422: 'Input not usable',
  426: 'The app is too old to send',
  429: 'Too many requests',
  500: 'A fault of ours',
  503: 'Not ready',
  507: 'No room left',
}
