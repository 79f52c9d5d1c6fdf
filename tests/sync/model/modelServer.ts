import type { SheetAnswers } from '@/shared/schemas/sheet'
import { mergeChoice, settleByPlanner } from '@/shared/sync/mergeChoice'
import { mergeDeletion, mergeUndeletion } from '@/shared/sync/mergeDeletion'
import { mergeSheet, NEW_SHEET } from '@/shared/sync/mergeSheet'
import { mutationFingerprint } from '@/shared/sync/mutationFingerprint'
import { planBatch, type BatchEntry, type BatchPlan, type BatchStep, type KnownMutation } from '@/shared/sync/planBatch'
import type { MergeResult, SheetRecord, Writing } from '@/shared/sync/sheetRecord.types'
import type { Break, ModelMutation, Outcome, PullReply, PushReply } from './model.types'
import { ModelDistrict, type PullWish } from './modelDistrict'
import { requireNothingSilent } from './requireNothingSilent'

interface Judged extends KnownMutation {
  readonly status: 'applied' | 'rejected'
  readonly change: number
}

/** The protocol's server in memory, on the product's own rules for order, identity and merging. */
export class ModelServer {
  readonly district: ModelDistrict
  readonly quarantine = new Map<string, ModelMutation>()
  readonly judged = new Map<string, Judged>()
  /** Mutation ids in the order of their effects; none may be in it twice. */
  readonly effects: string[] = []
  /** People whose account is shut. */
  readonly shut = new Set<string>()
  readonly #numbers = new Map<string, Map<number, KnownMutation>>()
  readonly #lastSeq = new Map<string, number>()
  readonly #newestMs = new Map<string, number>()

  constructor(readonly broken: Break | null) {
    this.district = new ModelDistrict(broken)
  }

  pull(wish: PullWish & { readonly deviceId: string }): PullReply {
    return { ...this.district.pull(wish), ackSeq: this.#lastSeq.get(wish.deviceId) ?? 0 }
  }

  push(deviceId: string, batch: readonly ModelMutation[]): PushReply {
    const entries = batch.map((mutation) => ({
      id: mutation.id,
      seq: mutation.seq,
      sha256: mutationFingerprint(mutation),
    }))
    const plan = this.#plan(deviceId, entries)
    if (plan.kind !== 'go') return { stop: plan.kind, expected: plan.expected }
    const numbers = this.#numbers.get(deviceId) ?? new Map<number, KnownMutation>()
    for (const entry of entries) numbers.set(entry.seq, entry)
    this.#numbers.set(deviceId, numbers)
    this.#lastSeq.set(deviceId, plan.lastSeq)
    return { outcomes: batch.map((mutation, at) => this.#judge(deviceId, mutation, entries[at]!, plan.steps[at]!)) }
  }

  #plan(deviceId: string, entries: readonly BatchEntry[]): BatchPlan {
    const bySeq = new Map(this.#numbers.get(deviceId))
    const byId = new Map<string, KnownMutation>(this.judged)
    const lastSeq = this.#lastSeq.get(deviceId) ?? 0
    switch (this.broken) {
      case 'number-only':
        for (const entry of entries.filter(({ seq }) => seq <= lastSeq)) {
          bySeq.set(entry.seq, entry)
          byId.set(entry.id, entry)
        }
        return planBatch(entries, { lastSeq, byId, bySeq })
      case 'id-only-per-device': {
        const own = new Set([...bySeq.values()].map(({ id }) => id))
        return planBatch(entries, { lastSeq, bySeq, byId: new Map([...byId].filter(([id]) => own.has(id))) })
      }
      case 'gap-skip':
        return planBatch(entries, { lastSeq: Math.max(lastSeq, (entries[0]?.seq ?? 1) - 1), byId, bySeq })
      case 'no-dedupe':
        return {
          kind: 'go',
          steps: entries.map((): BatchStep => 'fresh'),
          lastSeq: Math.max(lastSeq, entries.at(-1)!.seq),
        }
      default:
        return planBatch(entries, { lastSeq, byId, bySeq })
    }
  }

  #judge(deviceId: string, mutation: ModelMutation, entry: BatchEntry, step: BatchStep): Outcome {
    const { id, act } = mutation
    const before = this.judged.get(id)
    if (step !== 'fresh') {
      const isRejected = step === 'reused' || before?.status === 'rejected'
      return { id, status: isRejected ? 'rejected' : 'replay', change: before?.change ?? 0 }
    }
    if (act.kind === 'set' && act.isBad) {
      if (this.broken !== 'drop-rejected') this.quarantine.set(id, mutation)
      this.judged.set(id, { ...entry, status: 'rejected', change: 0 })
      return { id, status: 'rejected', change: 0 }
    }
    this.effects.push(id)
    const change = this.#apply(deviceId, mutation)
    this.judged.set(id, { ...entry, status: 'applied', change })
    return { id, status: 'applied', change }
  }

  #apply(deviceId: string, mutation: ModelMutation): number {
    const { sheetId, seen, act } = mutation
    if (act.kind === 'photo') return this.#declare(act.photoId, sheetId)
    const before = this.district.sheets.get(sheetId)?.record ?? null
    const writing = { deviceId, seen, change: ++this.district.head }
    const merged = this.#merge(before, mutation, writing)
    if (before) requireNothingSilent(before, merged, writing)
    this.#write(sheetId, merged, writing.change)
    return this.district.sheets.get(sheetId)?.change ?? 0
  }

  setShut(personId: string, isShut: boolean): void {
    if (isShut) this.shut.add(personId)
    else this.shut.delete(personId)
  }

  /** A record that comes again for a photo that is there changes nothing of its bytes. */
  #declare(photoId: string, sheetId: string): number {
    const { photos } = this.district
    const change = ++this.district.head
    photos.set(photoId, { id: photoId, sheetId, state: photos.get(photoId)?.state ?? 'declared', change })
    return change
  }

  /** All bytes of a photo have come; before its record nobody knows of it (U1). */
  store(photoId: string, sheetId: string): void {
    const { photos } = this.district
    if (!photos.has(photoId) && this.broken !== 'photo-before-record') return
    if (photos.get(photoId)?.state === 'stored') return
    photos.set(photoId, { id: photoId, sheetId, state: 'stored', change: ++this.district.head })
  }

  #merge(before: SheetRecord | null, { act, atMs }: ModelMutation, writing: Writing): MergeResult {
    const sheet = before ?? NEW_SHEET
    switch (act.kind) {
      case 'photo':
        return unchanged(sheet)
      case 'set':
        return this.#mergeSet(before, act.set, { ...writing, atMs })
      case 'delete':
        return before ? this.#mergeDelete(sheet, writing) : unchanged(sheet)
      case 'undelete':
        return mergeUndeletion(sheet)
      case 'resolve': {
        const conflict = this.district.conflicts.get(act.conflictId)
        if (!conflict?.isOpen) return unchanged(sheet)
        this.district.conflicts.set(conflict.id, { ...conflict, isOpen: false, change: ++this.district.head })
        return mergeChoice(sheet, { ...conflict.aside, choice: act.choice }, writing)
      }
    }
  }

  #mergeSet(
    before: SheetRecord | null,
    set: SheetAnswers,
    { atMs, ...writing }: Writing & { atMs: number },
  ): MergeResult {
    const merged = mergeSheet(before, set, writing)
    switch (this.broken) {
      case 'clock': {
        const isNewest = atMs >= (this.#newestMs.get(writing.deviceId) ?? -Infinity)
        this.#newestMs.set(writing.deviceId, atMs)
        return { ...(isNewest ? merged : unchanged(before ?? NEW_SHEET)), setAside: [] }
      }
      case 'whole-row':
        return { ...merged, sheet: { ...merged.sheet, answers: set } }
      case 'blind-over-checked':
        return mergeSheet(before && { ...before, state: 'handed-in' }, set, writing)
      default:
        return merged
    }
  }

  #mergeDelete(sheet: SheetRecord, writing: Writing): MergeResult {
    if (this.broken !== 'deletes-unseen') return mergeDeletion(sheet, writing)
    return {
      sheet: { ...sheet, deletion: { change: writing.change, deviceId: writing.deviceId } },
      setAside: [],
      isChanged: true,
    }
  }

  #write(sheetId: string, merged: MergeResult, change: number): void {
    const { sheets, conflicts } = this.district
    if (merged.isChanged) sheets.set(sheetId, { id: sheetId, record: merged.sheet, change })
    for (const aside of merged.setAside) {
      const id = `c${++this.district.head}`
      conflicts.set(id, { id, sheetId, aside, isOpen: true, change: this.district.head })
    }
  }

  /** The planner's word on a sheet. */
  review(sheetId: string, state: 'checked' | 'sent-back'): void {
    const sheet = this.district.sheets.get(sheetId)
    if (!sheet || sheet.record.deletion) return
    const change = ++this.district.head
    const question = state === 'checked' ? null : 'why?'
    const record = { ...sheet.record, state, question, reviewChange: change }
    this.district.sheets.set(sheetId, { ...sheet, record, change })
  }

  /** The planner's choice in a conflict. */
  settle(position: number, choice: 'kept' | 'set-aside'): void {
    const open = [...this.district.conflicts.values()].filter(({ isOpen }) => isOpen)
    const conflict = open[position % Math.max(1, open.length)]
    const sheet = conflict && this.district.sheets.get(conflict.sheetId)
    if (!conflict || !sheet) return
    const change = ++this.district.head
    const merged = settleByPlanner(sheet.record, { ...conflict.aside, choice }, { deviceId: 'desk', seen: 0, change })
    this.#write(sheet.id, merged, change)
    this.district.conflicts.set(conflict.id, { ...conflict, isOpen: false, change: ++this.district.head })
  }
}

function unchanged(sheet: SheetRecord): MergeResult {
  return { sheet, setAside: [], isChanged: false }
}
