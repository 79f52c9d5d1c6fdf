import { canonicalJson } from '@/shared/sync/canonicalJson'
import { syncDigest } from '@/shared/sync/syncDigest'
import type { Break, ModelConflict, ModelCursor, ModelPhoto, ModelSheet, PulledRow, PullReply } from './model.types'

export const BUILDINGS = ['e1', 'e2', 'e3'] as const
export const BEATS = ['b1', 'b2'] as const

export interface PullWish {
  readonly personId: string
  readonly cursor: ModelCursor | null
  readonly limit: number
}

/** What is there, who may see it, and what changed after a cursor. */
export class ModelDistrict {
  head = 0
  readonly sheets = new Map<string, ModelSheet>()
  readonly conflicts = new Map<string, ModelConflict>()
  readonly photos = new Map<string, ModelPhoto>()
  readonly #beatOf = new Map<string, { beat: string | null; change: number }>()
  readonly #surveyorOf = new Map<string, string>()
  #exits: PulledRow[] = []

  constructor(readonly broken: Break | null) {
    BEATS.forEach((beat, index) => this.#surveyorOf.set(beat, `p${index}`))
    BUILDINGS.forEach((id, index) => this.#beatOf.set(id, { beat: BEATS[index % 2] ?? null, change: ++this.head }))
  }

  assign(beat: string, personId: string): void {
    this.#surveyorOf.set(beat, personId)
  }

  /** A building goes to another beat with what hangs on it; the old beat learns that it left. */
  move(buildingId: string, beat: string | null): void {
    const before = this.#beatOf.get(buildingId)
    if (!before || before.beat === beat) return
    const leaving = this.#rows().filter((row) => row.buildingId === buildingId)
    this.#beatOf.set(buildingId, { beat, change: ++this.head })
    for (const { type, id } of leaving) {
      if (type === 'sheet') this.sheets.set(id, { ...this.sheets.get(id)!, change: ++this.head })
      if (type === 'photo') this.photos.set(id, { ...this.photos.get(id)!, change: ++this.head })
      if (type === 'conflict') this.conflicts.set(id, { ...this.conflicts.get(id)!, change: ++this.head })
    }
    if (before.beat === null || this.broken === 'no-exit') return
    this.#exits.push(...leaving.map((row) => ({ ...row, beat: before.beat, change: ++this.head, isGone: true })))
  }

  beatsOf(personId: string): string[] {
    return BEATS.filter((beat) => this.#surveyorOf.get(beat) === personId)
  }

  /** Rows a person's phone must hold. */
  heldBy(personId: string): PulledRow[] {
    const beats = this.beatsOf(personId)
    return this.#rows().filter((row) => isIn(row, beats) && !row.isGone)
  }

  pull({ personId, cursor, limit }: PullWish): Omit<PullReply, 'ackSeq'> {
    const beats = this.beatsOf(personId)
    const from = cursor ?? { changeNo: 0, beats, filling: [], filledTo: 0 }
    const added = this.broken === 'no-fill' ? [] : beats.filter((beat) => !from.beats.includes(beat))
    const filledFrom = canonicalJson(added) === canonicalJson(from.filling) ? from.filledTo : 0
    const fill = this.#changed(added, { after: filledFrom, upTo: from.changeNo, scope: beats }).slice(0, limit)
    const last = fill[limit - 1]
    if (last) {
      const kept = from.beats.filter((beat) => beats.includes(beat))
      const next = { ...from, beats: kept, filling: added, filledTo: last.change }
      return { rows: fill, cursor: next, more: true, beats, digest: null }
    }
    return this.#goOn(personId, { from, fill, room: limit - fill.length })
  }

  /** The page after what was filled in: everything beyond the cursor, in the order of changes. */
  #goOn(
    personId: string,
    { from, fill, room }: { from: ModelCursor; fill: readonly PulledRow[]; room: number },
  ): Omit<PullReply, 'ackSeq'> {
    const beats = this.beatsOf(personId)
    const rest = this.#changed(beats, { after: from.changeNo, upTo: this.head, scope: beats })
    const more = rest.length > room
    const served = rest.slice(0, room)
    const changeNo = more ? (served.at(-1)?.change ?? from.changeNo) : this.head
    return {
      rows: [...fill, ...served],
      cursor: { changeNo, beats, filling: [], filledTo: 0 },
      more,
      beats,
      digest: more ? null : syncDigest(this.heldBy(personId)),
    }
  }

  #changed(
    beats: readonly string[],
    { after, upTo, scope }: { after: number; upTo: number; scope: readonly string[] },
  ): PulledRow[] {
    const hasLeft = ({ buildingId }: PulledRow) => {
      const beat = this.#beatOf.get(buildingId)?.beat ?? null
      return beat === null || !scope.includes(beat)
    }
    return [...this.#rows(), ...this.#exits.filter(hasLeft)]
      .filter((row) => isIn(row, beats) && row.change > after && row.change <= upTo)
      .sort((one, other) => one.change - other.change)
  }

  /** Every row that is there, and the tombstones. */
  #rows(): PulledRow[] {
    const beatOf = (buildingId: string) => this.#beatOf.get(buildingId)?.beat ?? null
    const place = (buildingId: string) => ({ buildingId, beat: beatOf(buildingId) })
    return [
      ...[...this.#beatOf].map(([id, { change }]): PulledRow => ({
        type: 'building',
        id,
        ...place(id),
        change,
        isGone: false,
        text: '',
      })),
      ...[...this.sheets.values()].map(({ id, change, record }): PulledRow => ({
        type: 'sheet',
        id,
        ...place(id),
        change,
        isGone: record.deletion !== null,
        text: canonicalJson([record.answers, record.state, record.revision]),
      })),
      ...[...this.photos.values()].map(({ id, sheetId, state, change }): PulledRow => ({
        type: 'photo',
        id,
        ...place(sheetId),
        change,
        isGone: false,
        text: state,
      })),
      ...[...this.conflicts.values()].map(({ id, sheetId, change, isOpen, aside }): PulledRow => ({
        type: 'conflict',
        id,
        ...place(sheetId),
        change,
        isGone: false,
        text: canonicalJson([isOpen, aside.group, aside.kept, aside.setAside]),
      })),
    ]
  }
}

function isIn({ beat }: PulledRow, beats: readonly string[]): boolean {
  return beat !== null && beats.includes(beat)
}
