import { syncDigest } from '@/shared/sync/syncDigest'
import type { Break, ModelCursor, ModelMutation, PulledRow, PullReply } from './model.types'
import type { ModelServer } from './modelServer'

export const FAULTS = [
  'ok',
  'request-lost',
  'answer-lost',
  'twice',
  'reordered',
  'pull-lost',
  'pull-only',
  'ahead',
] as const
export type Fault = (typeof FAULTS)[number]

interface Memory {
  readonly deviceId: string
  readonly nextSeq: number
  readonly bag: readonly ModelMutation[]
  readonly answered: ReadonlySet<string>
  readonly base: Map<string, PulledRow>
  readonly gone: Map<string, number>
  readonly cursor: ModelCursor | null
}
const BATCH = 5

/** A phone by the rules of the protocol, in memory, with what a network and a restored backup do to it. */
export class ModelPhone {
  memory: Memory
  clockMs = 0
  /** Its app is older than the server takes: it may pull and not push (P12). */
  isOld = false
  /** Work that was wiped from the phone by restoring a copy; no protocol can save it unless it was sent. */
  readonly wiped = new Set<string>()
  readonly saved: ModelMutation[] = []
  /** How many of those were saved before the last restored copy: what they did may be off the screen for a while. */
  savedBeforeRestore = 0
  #copy: Memory | null = null
  #sent: (readonly ModelMutation[])[] = []
  #enrolments = 0

  constructor(
    readonly name: string,
    readonly personId: string,
    readonly broken: Break | null,
  ) {
    this.memory = {
      deviceId: name,
      nextSeq: 1,
      bag: [],
      answered: new Set(),
      base: new Map(),
      gone: new Map(),
      cursor: null,
    }
  }

  row(type: PulledRow['type'], id: string): PulledRow | undefined {
    return this.memory.base.get(`${type}/${id}`)
  }

  /** Only what is on the phone can be written on. */
  save(sheetId: string, act: ModelMutation['act'], seenOf = this.row('sheet', sheetId)): void {
    if (!this.row('building', sheetId)) return
    const { deviceId, nextSeq, bag, gone } = this.memory
    const seen = seenOf?.change ?? gone.get(`sheet/${sheetId}`) ?? 0
    const id = `${deviceId}:${nextSeq}:${this.saved.length}`
    const mutation = { id, seq: nextSeq, sheetId, seen, act, atMs: this.clockMs }
    this.saved.push(mutation)
    this.memory = { ...this.memory, nextSeq: nextSeq + 1, bag: [...bag, mutation] }
  }

  keepCopy(): void {
    this.#copy = structuredClone(this.memory)
  }

  restoreCopy(): void {
    if (!this.#copy) return
    const kept = new Set(this.#copy.bag.map(({ id }) => id))
    for (const { id } of this.memory.bag) if (!kept.has(id)) this.wiped.add(id)
    this.memory = structuredClone(this.#copy)
    this.savedBeforeRestore = this.saved.length
    this.#sent = []
  }

  sync(server: ModelServer, fault: Fault, limit: number): void {
    if (server.shut.has(this.personId) && this.broken !== 'serves-shut-out') return
    if (fault === 'ahead') {
      if (this.#isRefused()) return
      const early = this.#waiting().slice(2, 7)
      if (early.length > 0) server.push(this.memory.deviceId, early)
      return
    }
    if (fault === 'pull-only' || this.#push(server, fault)) this.#pull(server, fault, limit)
  }

  /** Sends the bytes of its photos, also of some whose record is not there yet. */
  upload(server: ModelServer): void {
    if (server.shut.has(this.personId)) return
    for (const { id, sheetId, act } of this.saved) {
      if (act.kind === 'photo' && !this.wiped.has(id)) server.store(act.photoId, sheetId)
    }
  }

  #isRefused(): boolean {
    return this.isOld && this.broken !== 'takes-from-old'
  }

  #waiting(): ModelMutation[] {
    return this.memory.bag.filter(({ id }) => !this.memory.answered.has(id))
  }

  /** @returns whether an answer came that lets the phone go on */
  #push(server: ModelServer, fault: Fault): boolean {
    const batch = this.#waiting().slice(0, BATCH)
    if (batch.length === 0 || this.#isRefused()) return true
    this.#sent.push(batch)
    if (this.broken === 'ack-on-send') this.#drop(({ id }) => batch.some((entry) => entry.id === id))
    if (fault === 'request-lost') return false
    const reply = this.#deliver(server, batch, fault)
    return fault !== 'answer-lost' && this.#hear(reply)
  }

  #deliver(server: ModelServer, batch: readonly ModelMutation[], fault: Fault) {
    const { deviceId } = this.memory
    const reply = server.push(deviceId, batch)
    if (fault === 'twice') server.push(deviceId, batch)
    if (fault === 'reordered' && this.#sent.length > 1) server.push(deviceId, this.#sent[0] ?? [])
    return reply
  }

  #hear(reply: ReturnType<ModelServer['push']>): boolean {
    if ('stop' in reply) {
      if (reply.stop === 'fork' || !this.memory.bag.some(({ seq }) => seq === reply.expected)) this.#enrolAnew()
      return false
    }
    const answered = new Set([...this.memory.answered, ...reply.outcomes.map(({ id }) => id)])
    this.memory = { ...this.memory, answered }
    if (this.broken === 'ack-on-push') this.#drop(({ id }) => answered.has(id))
    return true
  }

  #pull(server: ModelServer, fault: Fault, limit: number): void {
    for (;;) {
      const { deviceId, cursor } = this.memory
      const page = server.pull({ deviceId, personId: this.personId, cursor, limit })
      if (fault === 'pull-lost') return
      this.#take(page)
      if (page.digest) this.#requireDigest(page.digest)
      if (page.more) continue
      return this.#acknowledge(page.ackSeq)
    }
  }

  #take({ rows, cursor, beats }: PullReply): void {
    for (const row of rows) this.#takeRow(row)
    const { base } = this.memory
    for (const [name, { type, beat }] of base) {
      if (type === 'building' && (beat === null || !beats.includes(beat))) base.delete(name)
    }
    for (const [name, { buildingId }] of base) if (!base.has(`building/${buildingId}`)) base.delete(name)
    this.memory = { ...this.memory, cursor }
  }

  #takeRow(row: PulledRow): void {
    const { base, gone } = this.memory
    const name = `${row.type}/${row.id}`
    if (row.isGone) {
      base.delete(name)
      gone.set(name, row.change)
    } else if ((base.get(name)?.change ?? 0) < row.change) base.set(name, row)
  }

  #requireDigest(digest: NonNullable<PullReply['digest']>): void {
    const held = syncDigest(this.memory.base.values())
    if (held.count === digest.count && held.xor64 === digest.xor64) return
    throw new Error(`${this.name} holds ${held.count} rows, should hold ${digest.count}`)
  }

  #acknowledge(ackSeq: number): void {
    if (this.broken === 'ack-blind') return this.#drop(({ seq }) => seq <= ackSeq)
    if (ackSeq >= this.memory.nextSeq) return this.#enrolAnew()
    this.#drop(({ id, seq }) => seq <= ackSeq && this.memory.answered.has(id))
  }

  #drop(isDone: (mutation: ModelMutation) => boolean): void {
    this.memory = { ...this.memory, bag: this.memory.bag.filter((mutation) => !isDone(mutation)) }
  }

  /** A new device id, the bag numbered from 1, the same mutation ids. */
  #enrolAnew(): void {
    this.#enrolments += 1
    const bag = this.memory.bag.map((mutation, index) => ({ ...mutation, seq: index + 1 }))
    const deviceId = `${this.name}.${this.#enrolments}`
    this.memory = { ...this.memory, deviceId, bag, nextSeq: bag.length + 1, answered: new Set() }
    this.#sent = []
  }
}
