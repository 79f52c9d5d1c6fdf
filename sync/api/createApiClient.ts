import { API_PREFIX, type Endpoint, type EndpointInput, type EndpointReply } from '@/shared/api/defineEndpoint'
import { problem } from '@/shared/schemas/problem'
import { ApiError, UnreachableError } from './ApiError'

/** Parts of an input that an endpoint does not take may be left out. */
export type CallInput<E extends Endpoint> = Partial<EndpointInput<E>>

export interface ApiClient {
  /**
   * Calls an endpoint of the contract.
   *
   * @throws {ApiError} the server refused
   * @throws {UnreachableError} no answer, or not one of ours
   */
  call<E extends Endpoint>(endpoint: E, input?: CallInput<E>, signal?: AbortSignal): Promise<EndpointReply<E>>
  /** For bodies and replies that are not JSON (files, chunks, pictures). Refusals throw as in `call`. */
  send(method: string, path: string, options?: SendOptions): Promise<Response>
}

export interface SendOptions {
  readonly body?: BodyInit
  readonly headers?: Readonly<Record<string, string>>
  readonly signal?: AbortSignal
}

export interface ApiClientParts {
  /** Access token for the next request; null when nobody is signed in. */
  readonly accessToken: () => string | null
  /** Gets a fresh access token after a 401; null when signing in again is needed. */
  readonly renew: () => Promise<string | null>
  readonly origin?: string
  readonly timeoutMs?: number
}

/** The only way to the server: typed by the contract, replies parsed, one retry after a renewed token. */
export function createApiClient({ accessToken, renew, origin = '', timeoutMs = 60_000 }: ApiClientParts): ApiClient {
  const request = async (
    method: string,
    path: string,
    { body, headers, signal }: SendOptions,
    token: string | null,
  ): Promise<Response> => {
    const limit = AbortSignal.timeout(timeoutMs)
    try {
      return await fetch(`${origin}${API_PREFIX}${path}`, {
        method,
        ...(body === undefined ? {} : { body }),
        headers: {
          Accept: 'application/json',
          ...headers,
          ...(token === null ? {} : { Authorization: `Bearer ${token}` }),
        },
        signal: signal ? AbortSignal.any([signal, limit]) : limit,
        credentials: 'same-origin',
        cache: 'no-store',
      })
    } catch (error) {
      if (signal?.aborted) throw error
      throw new UnreachableError('no answer from the server', { cause: error })
    }
  }
  const send = async (method: string, path: string, options: SendOptions = {}): Promise<Response> => {
    const token = accessToken()
    let response = await request(method, path, options, token)
    if (response.status === 401 && !path.startsWith('/auth/')) {
      const renewed = await renew()
      if (renewed !== null) response = await request(method, path, options, renewed)
    }
    if (!response.ok) throw await toError(response)
    return response
  }
  const call = async <E extends Endpoint>(
    endpoint: E,
    input: CallInput<E> = {},
    signal?: AbortSignal,
  ): Promise<EndpointReply<E>> => {
    const { path, body } = toRequest(endpoint, input)
    const response = await send(endpoint.method, path, {
      ...(body === undefined ? {} : { body, headers: { 'Content-Type': 'application/json' } }),
      ...(signal ? { signal } : {}),
    })
    return endpoint.response.parse(await readJson(response)) as EndpointReply<E>
  }
  return { call, send }
}

/** Path with parameters and query filled in, and the body as JSON. */
export function toRequest<E extends Endpoint>(
  endpoint: E,
  input: CallInput<E>,
): { path: string; body: string | undefined } {
  const params = (input.params ?? {}) as Record<string, string>
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(params[name] ?? ''))
  const query = new URLSearchParams()
  for (const [name, value] of Object.entries((input.query ?? {}) as Record<string, unknown>)) {
    if (value !== undefined) query.set(name, String(value))
  }
  const tail = query.size > 0 ? `?${query.toString()}` : ''
  return { path: `${path}${tail}`, body: endpoint.method === 'GET' ? undefined : JSON.stringify(input.body ?? {}) }
}

async function toError(response: Response): Promise<Error> {
  const parsed = problem.safeParse(await readJson(response).catch(() => null))
  return parsed.success
    ? new ApiError(parsed.data, readRetryAfter(response.headers.get('Retry-After')))
    : new UnreachableError(`an answer that is not ours: ${response.status}`)
}

/** Seconds; the form with a date is not used by this server. */
function readRetryAfter(header: string | null): number | null {
  return header !== null && /^\d{1,6}$/.test(header) ? Number(header) : null
}

async function readJson(response: Response): Promise<unknown> {
  try {
    return await response.json()
  } catch (error) {
    throw new UnreachableError('an answer that is not JSON', { cause: error })
  }
}
