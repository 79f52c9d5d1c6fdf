/** One mutation of a batch as far as order and identity go. */
export interface BatchEntry {
  readonly id: string
  readonly seq: number
  /** SHA-256 of its fingerprint. */
  readonly sha256: string
}

/** What the server remembers of a mutation it has judged before. */
export interface KnownMutation {
  readonly id: string
  readonly sha256: string
}

/** What the server knows of a device and of the mutations of a batch. */
export interface BatchKnowledge {
  /** Highest sequence number of this device that was judged; 0 before the first. */
  readonly lastSeq: number
  /** By mutation id, whichever device sent it. */
  readonly byId: ReadonlyMap<string, KnownMutation>
  /** By sequence number of this device. */
  readonly bySeq: ReadonlyMap<number, KnownMutation>
}

/**
 * `repeat`: judged before, answer as then · `renumbered`: judged before under another device number, answer as then and
 * take the number · `reused`: the id of other work, set apart · `fresh`: judge it now.
 */
export type BatchStep = 'repeat' | 'renumbered' | 'reused' | 'fresh'

export type BatchPlan =
  | { readonly kind: 'go'; readonly steps: readonly BatchStep[]; readonly lastSeq: number }
  /** A batch overtook another; nothing of it is judged. */
  | { readonly kind: 'gap'; readonly expected: number }
  /** The numbers of this device stand for other work: it was restored from a copy, or copied. */
  | { readonly kind: 'fork'; readonly expected: number }

/**
 * Decides for each mutation of a batch, in its order, whether it is new, by two identities: its own id and the number
 * the device gave it (rules P2 to P5). Neither is enough alone.
 */
export function planBatch(batch: readonly BatchEntry[], { lastSeq, byId, bySeq }: BatchKnowledge): BatchPlan {
  const steps: BatchStep[] = []
  const known = new Map(byId)
  let last = lastSeq
  for (const entry of batch) {
    if (entry.seq > last + 1) return { kind: 'gap', expected: last + 1 }
    if (entry.seq <= last && !isSame(bySeq.get(entry.seq), entry)) return { kind: 'fork', expected: last + 1 }
    const isNumbered = entry.seq <= last
    last = Math.max(last, entry.seq)
    const recorded = known.get(entry.id)
    if (recorded === undefined) known.set(entry.id, entry)
    steps.push(stepOf(recorded, entry, isNumbered))
  }
  return { kind: 'go', steps, lastSeq: last }
}

function stepOf(recorded: KnownMutation | undefined, entry: BatchEntry, isNumbered: boolean): BatchStep {
  if (recorded === undefined) return 'fresh'
  // An id that was used again for other work got its number as well; its first owner keeps another payload.
  if (recorded.sha256 !== entry.sha256) return 'reused'
  return isNumbered ? 'repeat' : 'renumbered'
}

function isSame(recorded: KnownMutation | undefined, entry: BatchEntry): boolean {
  return recorded !== undefined && recorded.id === entry.id && recorded.sha256 === entry.sha256
}
