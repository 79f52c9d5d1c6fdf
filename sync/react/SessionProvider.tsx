import { createContext, useContext, useSyncExternalStore, type ReactNode } from 'react'
import type { Account } from '@/shared/schemas/person'
import type { ApiClient } from '@/sync/api/createApiClient'
import type { SessionState, SessionStore } from './sessionStore'

const SessionContext = createContext<SessionStore | null>(null)

interface SessionProviderProps {
  readonly store: SessionStore
  readonly children: ReactNode
}

/** Hands the session of this device to everything below. */
export function SessionProvider({ store, children }: SessionProviderProps) {
  return <SessionContext value={store}>{children}</SessionContext>
}

export function useSessionStore(): SessionStore {
  const store = useContext(SessionContext)
  if (!store) throw new Error('no SessionProvider above')
  return store
}

export function useSession(): SessionState {
  const store = useSessionStore()
  return useSyncExternalStore(store.subscribe, store.getState, store.getState)
}

/** Who is signed in; only below a route that lets nobody else in. */
export function useAccount(): Account {
  const { account } = useSession()
  if (!account) throw new Error('nobody is signed in here')
  return account
}

/** The contract-typed way to the server. */
export function useApi(): ApiClient {
  return useSessionStore().api
}
