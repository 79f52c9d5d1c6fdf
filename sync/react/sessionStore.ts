import { refreshSession, signIn, signOut, type Session } from '@/shared/api/auth'
import { account as accountSchema, type Account } from '@/shared/schemas/person'
import { surrenderBag } from '@/shared/api/sync'
import type { SendSurrender } from '@/sync/surrenderBag'
import { ApiError, UnreachableError } from '@/sync/api/ApiError'
import { createApiClient, type ApiClient } from '@/sync/api/createApiClient'

/** Small texts that outlive a reload: the account (never a token), the device, a rotation under way. */
export interface TextStore {
  get(key: string): string | null
  set(key: string, value: string): void
  remove(key: string): void
}

export interface SessionState {
  /** `unknown` until the store was read; `signed-out` asks for sign-in. */
  readonly status: 'signed-out' | 'signed-in'
  readonly account: Account | null
  /** The refresh cookie ended: field work goes on, handing in asks to sign in again. */
  readonly mustSignInAgain: boolean
}

export interface SessionStore {
  readonly api: ApiClient
  readonly deviceId: () => string
  /** Hands a sealed bag over without a session: the one of a device that is shut out opens nothing. */
  readonly sendSurrender: SendSurrender
  /** Another id after the server knew this one for another phone; kept for all later requests. */
  renewDeviceId(): string
  getState(): SessionState
  subscribe(listener: () => void): () => void
  signIn(email: string, password: string, deviceName: string): Promise<Account>
  adopt(session: Session): Account
  /** The session goes on with another access token, for another device id. */
  adoptToken(accessToken: string): void
  /** Ends the session on the server if it is reached; what is kept on the device stays. */
  signOut(): Promise<void>
}

const KEYS = { account: 'tallystone.account', device: 'tallystone.device', rotation: 'tallystone.rotation' } as const

export interface SessionParts {
  readonly store: TextStore
  readonly newId: () => string
  /** 32 random hex digits. */
  readonly newRotationId: () => string
  readonly origin?: string
  /** Runs one renewal at a time over all tabs. */
  readonly alone?: <Result>(work: () => Promise<Result>) => Promise<Result>
}

/**
 * Session of one device without React: the account is remembered so that the field side opens without
 * network; tokens live in memory only, the refresh token in a cookie that scripts cannot read.
 */
export function createSessionStore({
  store,
  newId,
  newRotationId,
  origin,
  alone = (work) => work(),
}: SessionParts): SessionStore {
  const listeners = new Set<() => void>()
  let token: string | null = null
  let renewal: Promise<string | null> | null = null
  const known = readAccount(store)
  let state: SessionState = { status: known ? 'signed-in' : 'signed-out', account: known, mustSignInAgain: false }

  const setState = (next: SessionState) => {
    state = next
    listeners.forEach((listener) => listener())
  }
  const deviceId = () => {
    const kept = store.get(KEYS.device)
    if (kept) return kept
    const made = newId()
    store.set(KEYS.device, made)
    return made
  }
  const adopt = (session: Session): Account => {
    token = session.accessToken
    store.set(KEYS.account, JSON.stringify(session.account))
    setState({ status: 'signed-in', account: session.account, mustSignInAgain: false })
    return session.account
  }
  /** The rotation id is written before the call: a lost answer is asked for again under the same id. */
  const renew = () => {
    renewal ??= alone(async () => {
      const rotationId = store.get(KEYS.rotation) ?? newRotationId()
      store.set(KEYS.rotation, rotationId)
      try {
        const session = await api.call(refreshSession, { body: { rotationId } })
        store.remove(KEYS.rotation)
        adopt(session)
        return session.accessToken
      } catch (error) {
        if (!(error instanceof ApiError)) throw error
        if (error.status === 401 || error.status === 403) {
          store.remove(KEYS.rotation)
          token = null
          setState({ ...state, mustSignInAgain: true })
        }
        return null
      }
    }).finally(() => {
      renewal = null
    })
    return renewal
  }
  const api = createApiClient({ accessToken: () => token, renew, ...(origin === undefined ? {} : { origin }) })

  const plainApi = createApiClient({
    accessToken: () => null,
    renew: async () => null,
    ...(origin === undefined ? {} : { origin }),
  })
  return {
    api,
    deviceId,
    sendSurrender: (body, signal) => plainApi.call(surrenderBag, { body }, signal),
    renewDeviceId() {
      const made = newId()
      store.set(KEYS.device, made)
      return made
    },
    getState: () => state,
    subscribe(listener) {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    adopt,
    adoptToken(accessToken) {
      token = accessToken
    },
    async signIn(email, password, deviceName) {
      const attempt = () =>
        api.call(signIn, { body: { email, password, device: { deviceId: deviceId(), name: deviceName } } })
      try {
        return adopt(await attempt())
      } catch (error) {
        if (!(error instanceof ApiError) || error.code !== 'device-of-another-person') throw error
        store.set(KEYS.device, newId())
        return adopt(await attempt())
      }
    },
    async signOut() {
      try {
        await api.call(signOut, {})
      } catch (error) {
        // without network the cookie ends by itself; signing out of the device must still be possible
        if (!(error instanceof UnreachableError) && !(error instanceof ApiError)) throw error
      }
      token = null
      store.remove(KEYS.account)
      setState({ status: 'signed-out', account: null, mustSignInAgain: false })
    },
  }
}

function readAccount(store: TextStore): Account | null {
  const text = store.get(KEYS.account)
  if (!text) return null
  try {
    const parsed = accountSchema.safeParse(JSON.parse(text))
    return parsed.success ? parsed.data : null
  } catch {
    return null
  }
}
