/** What a person sees of handing in. */
export interface HandInState {
  readonly phase: 'resting' | 'sending' | 'fetching' | 'sending-photos' | 'waiting-to-retry'
  /** Sent so far and in all, of the phase. */
  readonly done: number
  readonly total: number
  readonly network: 'reached' | 'not-reached' | 'not-tried'
  /** Message key below `bag.` for why it stopped, or null. */
  readonly stoppedBecause:
    | 'no-network'
    | 'sign-in-again'
    | 'device-revoked'
    | 'surrendered'
    | 'upgrade-required'
    | 'server-fault'
    | 'device-full'
    | null
  readonly lastSyncedAt: string | null
  readonly nextTryAt: string | null
}

export interface HandIn {
  getState(): HandInState
  subscribe(listener: () => void): () => void
  /** Push, pull, photos. Safe to call at any time; one runs at a time. */
  handIn(): Promise<void>
}
