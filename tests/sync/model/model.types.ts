import type { SheetAnswers } from '@/shared/schemas/sheet'
import type { SyncDigest } from '@/shared/sync/syncDigest'
import type { SetAside, SheetRecord } from '@/shared/sync/sheetRecord.types'

/** Ways to break the protocol on purpose; the checks must find each. */
export const BREAKS = [
  'no-dedupe',
  'number-only',
  'id-only-per-device',
  'gap-skip',
  'drop-rejected',
  'ack-on-send',
  'ack-on-push',
  'ack-blind',
  'whole-row',
  'clock',
  'blind-over-checked',
  'no-exit',
  'no-fill',
  'deletes-unseen',
  'serves-shut-out',
  'takes-from-old',
  'photo-before-record',
] as const
export type Break = (typeof BREAKS)[number]

export interface ModelMutation {
  readonly id: string
  readonly seq: number
  readonly sheetId: string
  readonly seen: number
  readonly act:
    | { readonly kind: 'set'; readonly set: SheetAnswers; readonly isBad: boolean }
    | { readonly kind: 'delete' }
    | { readonly kind: 'undelete' }
    | { readonly kind: 'photo'; readonly photoId: string }
    | { readonly kind: 'resolve'; readonly conflictId: string; readonly choice: 'kept' | 'set-aside' }
  /** Clock of the phone; only a broken server looks at it. */
  readonly atMs: number
}

export interface ModelConflict {
  readonly id: string
  readonly sheetId: string
  readonly aside: SetAside
  readonly isOpen: boolean
  readonly change: number
}

export interface ModelSheet {
  readonly id: string
  readonly record: SheetRecord
  readonly change: number
}

/** A photo: its record first, then its bytes. */
export interface ModelPhoto {
  readonly id: string
  readonly sheetId: string
  readonly state: 'declared' | 'stored'
  readonly change: number
}

/** One row as it is pulled. */
export interface PulledRow {
  readonly type: 'building' | 'sheet' | 'conflict' | 'photo'
  readonly id: string
  readonly buildingId: string
  /** Beat of the building, as a phone learns it from the building's row. */
  readonly beat: string | null
  readonly change: number
  readonly isGone: boolean
  readonly text: string
}

export interface Outcome {
  readonly id: string
  readonly status: 'applied' | 'replay' | 'rejected'
  readonly change: number
}
export type PushReply =
  { readonly outcomes: readonly Outcome[] } | { readonly stop: 'gap' | 'fork'; readonly expected: number }

export interface ModelCursor {
  readonly changeNo: number
  readonly beats: readonly string[]
  readonly filling: readonly string[]
  readonly filledTo: number
}
export interface PullReply {
  readonly rows: readonly PulledRow[]
  readonly cursor: ModelCursor
  readonly more: boolean
  readonly ackSeq: number
  readonly beats: readonly string[]
  /** On the last page. */
  readonly digest: SyncDigest | null
}
