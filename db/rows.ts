import { z } from 'zod'
import { problem } from '@/shared/schemas/problem'
import { photoMeta, sheetAnswers, type SheetAnswers } from '@/shared/schemas/sheet'
import { beatEntity, buildingEntity, conflictEntity, photoEntity, sheetEntity } from '@/shared/schemas/sync'

export interface BaseRow {
  readonly id: string
  readonly change_no: number
  readonly fields: string
}

export interface OutboxRow {
  readonly mutation_id: string
  readonly seq: number
  readonly type: string
  readonly entity_id: string
  readonly building_id: string
  readonly payload: string
  readonly put_in_at: string
  readonly status: string | null
  readonly change_no: number | null
}

export interface DraftRow {
  readonly building_id: string
  readonly answers: string
  readonly seen: number
  readonly kept_at: string
}

export interface PhotoRow {
  readonly photo_id: string
  readonly sheet_id: string
  readonly meta: string
  readonly place: 'kept-here' | 'sent' | 'refused'
  readonly refusal: string | null
  readonly is_removed: number
}

export interface QuarantineRow {
  readonly mutation_id: string
  readonly type: string
  readonly building_id: string
  readonly payload: string
  readonly problem: string
}

const sheetPayload = z.object({ set: sheetAnswers })

/** The texts of the columns, read back. What was written here is trusted to be what it was. */
export const readColumn = {
  beat: (text: string) => beatEntity.parse(JSON.parse(text)),
  building: (text: string) => buildingEntity.parse(JSON.parse(text)),
  sheet: (text: string) => sheetEntity.parse(JSON.parse(text)),
  photo: (text: string) => photoEntity.parse(JSON.parse(text)),
  conflict: (text: string) => conflictEntity.parse(JSON.parse(text)),
  photoMeta: (text: string) => photoMeta.parse(JSON.parse(text)),
  problem: (text: string) => problem.parse(JSON.parse(text)),
  /** A draft may hold what a form does not accept yet. */
  draft: (text: string): SheetAnswers => JSON.parse(text) as SheetAnswers,
  sheetSet: (text: string): SheetAnswers => sheetPayload.parse(JSON.parse(text)).set,
}
