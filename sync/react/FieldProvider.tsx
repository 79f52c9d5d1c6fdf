import {
  createContext,
  useCallback,
  useContext,
  useEffect,
  useMemo,
  useRef,
  useState,
  useSyncExternalStore,
  type ReactNode,
} from 'react'
import { OpenElsewhereError } from '@/db/driver.types'
import type { FieldStore } from '@/db/fieldStore.types'
import { openFieldDatabase } from '@/db/openFieldDatabase'
import { createHandIn, type RunningHandIn } from '@/sync/createHandIn'
import type { HandIn, HandInState } from '@/sync/handIn.types'
import { handInBusy } from './handInBusy'
import { useAccount, useSessionStore } from './SessionProvider'

interface Field {
  readonly store: FieldStore
  readonly handIn: HandIn
}

export type FieldOpening =
  | { readonly kind: 'opening' }
  | { readonly kind: 'open'; readonly field: Field }
  | { readonly kind: 'elsewhere' }
  | { readonly kind: 'failed'; readonly reason: string }

interface OpeningContext {
  readonly opening: FieldOpening
  /** Takes the database over from the other tab. */
  readonly useHere: () => void
}

const FieldContext = createContext<OpeningContext | null>(null)

interface FieldProviderProps {
  readonly deviceName: string
  readonly children: ReactNode
}

/** Opens the device's database of who is signed in and hands in from it. */
export function FieldProvider({ deviceName, children }: FieldProviderProps) {
  const { opening, takeOver } = useOpening(deviceName)
  const context = useMemo(() => ({ opening, useHere: takeOver }), [opening, takeOver])
  return <FieldContext value={context}>{children}</FieldContext>
}

/** How far the database is; null for people who do not walk. */
export function useFieldOpening(): OpeningContext | null {
  return useContext(FieldContext)
}

function useOpening(deviceName: string) {
  const { organisationId, personId } = useAccount()
  const session = useSessionStore()
  const [opening, setOpening] = useState<FieldOpening>({ kind: 'opening' })
  const [attempt, setAttempt] = useState(0)
  useEffect(() => {
    let isLeft = false
    let leave = () => {}
    const open = async () => {
      const onTaken = () => {
        leave()
        setOpening({ kind: 'elsewhere' })
      }
      const database = await openFieldDatabase(
        { organisationId, personId },
        { takeOver: attempt > 0, onTaken, deviceId: session.deviceId },
      )
      const running = createHandIn({
        store: database.sync,
        api: session.api,
        deviceId: session.deviceId,
        renewDeviceId: () => session.renewDeviceId(),
        adoptToken: (token) => session.adoptToken(token),
        deviceName,
        publicKey: database.publicKey,
        sendSurrender: session.sendSurrender,
        now: () => new Date(),
        random: Math.random,
        later: (work, delayMs) => {
          const timer = setTimeout(work, delayMs)
          return () => clearTimeout(timer)
        },
      })
      const stopWaking = wake(running)
      const stopTelling = tellBusy(running)
      leave = () => {
        stopWaking()
        stopTelling()
        running.stop()
      }
      if (isLeft) {
        leave()
        await database.close()
        return
      }
      const stop = leave
      leave = () => {
        stop()
        void database.close().catch(() => undefined)
      }
      setOpening({ kind: 'open', field: { store: database.field, handIn: running } })
      void running.handIn()
    }
    open().catch((error: unknown) => {
      if (isLeft) return
      if (error instanceof OpenElsewhereError) setOpening({ kind: 'elsewhere' })
      else setOpening({ kind: 'failed', reason: error instanceof Error ? error.message : String(error) })
    })
    return () => {
      isLeft = true
      leave()
    }
  }, [organisationId, personId, session, deviceName, attempt])
  const takeOver = useCallback(() => {
    setOpening({ kind: 'opening' })
    setAttempt((before) => before + 1)
  }, [])
  return { opening, takeOver }
}

/** Hands in when the network may be back and when the app comes to the front. */
function wake(running: RunningHandIn): () => void {
  if (typeof window === 'undefined' || !('addEventListener' in window)) return () => {}
  const go = () => void running.handIn()
  const onVisible = () => {
    if (document.visibilityState === 'visible') go()
  }
  window.addEventListener('online', go)
  document.addEventListener('visibilitychange', onVisible)
  return () => {
    window.removeEventListener('online', go)
    document.removeEventListener('visibilitychange', onVisible)
  }
}

export function useField(): Field {
  const context = useContext(FieldContext)
  if (context?.opening.kind !== 'open') throw new Error('the database of the field is not open here')
  return context.opening.field
}

export function useHandInState(): HandInState {
  const { handIn } = useField()
  return useSyncExternalStore(handIn.subscribe, handIn.getState, handIn.getState)
}

/** The app must not change over to a newer one while the bag is on its way. */
function tellBusy(running: RunningHandIn): () => void {
  const tell = () => handInBusy.set(['sending', 'fetching', 'sending-photos'].includes(running.getState().phase))
  const stop = running.subscribe(tell)
  return () => {
    stop()
    handInBusy.set(false)
  }
}

/**
 * What a read of the device's database says, read anew after every change of it.
 *
 * @param read keep it with `useCallback`
 * @returns undefined until the first answer
 * @throws while rendering, what the read threw: a database that cannot be read must not look like an empty one
 */
export function useStored<Result>(read: (store: FieldStore) => Promise<Result>): Result | undefined {
  const { store } = useField()
  const [found, setFound] = useState<{ result: Result } | { fault: unknown } | undefined>(undefined)
  const latest = useRef(0)
  useEffect(() => {
    let isLeft = false
    const readNow = () => {
      const turn = ++latest.current
      read(store).then(
        (result) => {
          if (!isLeft && turn === latest.current) setFound({ result })
        },
        (fault: unknown) => {
          if (!isLeft && turn === latest.current) setFound({ fault })
        },
      )
    }
    readNow()
    const unsubscribe = store.subscribe(readNow)
    return () => {
      isLeft = true
      unsubscribe()
    }
  }, [read, store])
  if (found && 'fault' in found) throw found.fault
  return found?.result
}
