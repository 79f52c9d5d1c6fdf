import type { SheetAnswers, SheetState, PhotoMeta } from '@/shared/schemas/sheet'
import type { AreaGeometry } from '@/shared/schemas/primitives'
import type {
  BeatEntity,
  BuildingEntity,
  Change,
  ConflictEntity,
  PhotoEntity,
  SheetEntity,
} from '@/shared/schemas/sync'
import { presentOutline, type OutlineRow } from './presentOutline'

interface ChangeRow {
  id: string
  change_no: string
}
export interface BeatChangeRow extends ChangeRow {
  name: string
  round_id: string
  round_name: string
  district_name: string
  starts_on: string
  ends_on: string
  building_count: number
}
export interface BuildingChangeRow extends ChangeRow, OutlineRow {
  round_id: string
  beat_id: string
  geometry: AreaGeometry
}
export interface SheetChangeRow extends ChangeRow {
  round_id: string
  beat_id: string | null
  answers: SheetAnswers
  state: SheetState
  question: string | null
  revision: number
  reviewed_by_name: string | null
  reviewed_at: Date | null
  recorded_by_name: string
  recorded_at: Date
}
export interface PhotoRow {
  sheet_id: string
  sha256: string
  bytes: number
  mime: PhotoMeta['mime']
  width_px: number
  height_px: number
  tag: PhotoMeta['tag']
  taken_at: Date | null
}
export interface PhotoChangeRow extends ChangeRow, PhotoRow {
  state: PhotoEntity['state']
  refusal: string | null
}
export interface ConflictRow {
  sheet_id: string
  field_group: string
  kept: unknown
  set_aside: unknown
  kept_by_name: string | null
  set_aside_by_name: string | null
  state: ConflictEntity['state']
}
export interface ConflictChangeRow extends ChangeRow, ConflictRow {}

const core = ({ id, change_no }: ChangeRow) => ({ id, change: Number(change_no) })

export function presentBeatChange(row: BeatChangeRow): Change {
  const fields = {
    name: row.name,
    roundId: row.round_id,
    roundName: row.round_name,
    districtName: row.district_name,
    startsOn: row.starts_on,
    endsOn: row.ends_on,
    buildingCount: row.building_count,
  } satisfies BeatEntity
  return { ...core(row), type: 'beat', fields }
}

export function presentBuildingChange(row: BuildingChangeRow): Change {
  const fields = {
    roundId: row.round_id,
    beatId: row.beat_id,
    outline: presentOutline(row),
    geometry: row.geometry,
  } satisfies BuildingEntity
  return { ...core(row), type: 'building', fields }
}

export function presentSheetChange(row: SheetChangeRow): Change {
  const fields = {
    roundId: row.round_id,
    beatId: row.beat_id,
    answers: row.answers,
    review: {
      state: row.state,
      question: row.question,
      reviewedByName: row.reviewed_by_name,
      reviewedAt: row.reviewed_at?.toISOString() ?? null,
    },
    revision: row.revision,
    recordedByName: row.recorded_by_name,
    recordedAt: row.recorded_at.toISOString(),
  } satisfies SheetEntity
  return { ...core(row), type: 'sheet', fields }
}

export function presentPhotoMeta(photoId: string, row: PhotoRow): PhotoMeta {
  return {
    photoId,
    sheetId: row.sheet_id,
    sha256: row.sha256,
    bytes: row.bytes,
    mime: row.mime,
    widthPx: row.width_px,
    heightPx: row.height_px,
    tag: row.tag,
    takenAt: row.taken_at?.toISOString() ?? null,
  } satisfies PhotoMeta
}

export function presentPhotoChange(row: PhotoChangeRow): Change {
  const fields = { ...presentPhotoMeta(row.id, row), state: row.state, refusal: row.refusal } satisfies PhotoEntity
  return { ...core(row), type: 'photo', fields }
}

export function presentConflict(row: ConflictRow): ConflictEntity {
  return {
    sheetId: row.sheet_id,
    group: row.field_group,
    kept: row.kept,
    setAside: row.set_aside,
    keptByName: row.kept_by_name ?? '',
    setAsideByName: row.set_aside_by_name ?? '',
    state: row.state,
  } satisfies ConflictEntity
}

export function presentConflictChange(row: ConflictChangeRow): Change {
  return { ...core(row), type: 'conflict', fields: presentConflict(row) }
}
