import type { SheetAnswers, SheetGroup, SheetState } from '@/shared/schemas/sheet'

/** A sheet as the server keeps it, as far as merging goes. */
export interface SheetRecord {
  readonly answers: SheetAnswers
  /** Change number of the last write of each group. */
  readonly versions: Readonly<Partial<Record<SheetGroup, number>>>
  /** Device of the last write of each group. */
  readonly writers: Readonly<Partial<Record<SheetGroup, string>>>
  readonly state: SheetState
  readonly revision: number
  readonly question: string | null
  /** Change number of the planner's last word; 0 before the first. */
  readonly reviewChange: number
  /** Set while the sheet is deleted. */
  readonly deletion: { readonly change: number; readonly deviceId: string } | null
}

/** Who writes, and what was on the screen. */
export interface Writing {
  readonly deviceId: string
  /** Change number of the sheet that was on screen; 0 when it was made here. */
  readonly seen: number
  /** Change number of this write, higher than all before. */
  readonly change: number
}

/** A value that was not lost but laid aside for a person to look at. */
export interface SetAside {
  readonly group: SheetGroup | 'deletion'
  readonly kept: unknown
  readonly setAside: unknown
  readonly keptDeviceId: string | null
  readonly setAsideDeviceId: string | null
}

export interface MergeResult {
  readonly sheet: SheetRecord
  readonly setAside: readonly SetAside[]
  /** False when nothing of the sheet changed: all was said before, or everything became a proposal. */
  readonly isChanged: boolean
}
