import { randomUUID } from 'node:crypto'
import type {
  PushTargets,
  TargetBuilding,
  TargetConflict,
  TargetPhoto,
  TargetSheet,
} from '@/server/queries/readPushTargets'
import type { PhotoMeta } from '@/shared/schemas/sheet'
import type { MergeResult, SheetRecord, Writing } from '@/shared/sync/sheetRecord.types'

export interface SheetWrite {
  readonly sheetId: string
  readonly building: TargetBuilding
  readonly record: SheetRecord
  readonly recordedBy: string
  readonly change: number
}
export interface PhotoWrite extends Omit<PhotoMeta, 'takenAt'> {
  readonly takenAt: string | null
  readonly beatId: string | null
  readonly change: number
}
export interface ConflictWrite {
  readonly conflictId: string
  readonly sheetId: string
  readonly beatId: string | null
  readonly group: string
  readonly kept: unknown
  readonly setAside: unknown
  readonly keptDevice: string | null
  readonly setAsideDevice: string | null
  /** Who is named when a device is not known. */
  readonly recordedBy: string
  readonly change: number
}

/** Who hands in, from which device, and when by the server's clock. */
export interface Sender {
  readonly personId: string
  readonly deviceId: string
  readonly now: Date
}

/**
 * A batch on its way: what the database held under the lock, with what the mutations before did to it, and every row
 * that must be written at the end, once each.
 */
export class BatchDraft {
  readonly sheetWrites = new Map<string, SheetWrite>()
  readonly photoWrites = new Map<string, PhotoWrite>()
  /** Photo → deleted or back, and its change number. */
  readonly photoMarks = new Map<string, { readonly isDeleted: boolean; readonly change: number }>()
  readonly conflictWrites: ConflictWrite[] = []
  /** Conflict → change number of being settled. */
  readonly settled = new Map<string, number>()
  /** Thing → mutation of this batch that would have made it and was rejected. */
  readonly rejectedMakers: Map<string, string>
  #nextChange: number

  constructor(
    readonly targets: PushTargets,
    readonly sender: Sender,
    firstChange: number,
  ) {
    this.#nextChange = firstChange
    this.rejectedMakers = new Map(targets.rejectedMakers)
  }

  takeChange(): number {
    return this.#nextChange++
  }

  /** The building, where the sender may write on it. */
  building(sheetId: string): TargetBuilding | undefined {
    const building = this.targets.buildings.get(sheetId)
    return building?.isAllowed ? building : undefined
  }

  sheet(sheetId: string): TargetSheet | undefined {
    return this.sheetWrites.get(sheetId) ?? this.targets.sheets.get(sheetId)
  }

  photo(photoId: string): TargetPhoto | undefined {
    const stored = this.targets.photos.get(photoId)
    const written = this.photoWrites.get(photoId)
    const photo = written ? { ...written, takenBy: this.sender.personId, isDeleted: false } : stored
    const mark = this.photoMarks.get(photoId)
    return photo && mark ? { ...photo, ...mark } : photo
  }

  conflict(conflictId: string): TargetConflict | undefined {
    const conflict = this.targets.conflicts.get(conflictId)
    const change = this.settled.get(conflictId)
    return conflict && change !== undefined ? { ...conflict, isOpen: false, change } : conflict
  }

  /** Takes over what a merge made of a sheet. @returns ids of the conflicts it opened */
  writeSheet(sheetId: string, building: TargetBuilding, merged: MergeResult, writing: Writing): string[] {
    const before = this.sheet(sheetId)
    if (merged.isChanged) {
      this.sheetWrites.set(sheetId, {
        sheetId,
        building,
        record: merged.sheet,
        recordedBy: this.sender.personId,
        change: writing.change,
      })
    }
    return merged.setAside.map((aside) => {
      const conflictId = randomUUID()
      this.conflictWrites.push({
        conflictId,
        sheetId,
        beatId: building.beatId,
        group: aside.group,
        kept: aside.kept,
        setAside: aside.setAside,
        keptDevice: aside.keptDeviceId,
        setAsideDevice: aside.setAsideDeviceId,
        recordedBy: before?.recordedBy ?? this.sender.personId,
        change: this.takeChange(),
      })
      return conflictId
    })
  }
}

/** Most change numbers one mutation can use: its own, one conflict a group, and one of its deletion. */
export const MOST_CHANGES_PER_MUTATION = 18
