import type { StructureOrUnknown, Use, UseOrUnknown } from '@/shared/compute/factors/vocabulary'
import type { SheetState } from '@/shared/schemas/sheet'

/** A building of the frame; what belongs to a sheet is null (or `unknown`) while there is none. */
export interface LookRow {
  readonly buildingId: string
  readonly outlineId: string
  readonly beatId: string | null
  readonly reference: string
  readonly street: string | null
  readonly houseNumber: string | null
  readonly outlineFootprintM2: number
  readonly registerYear: number | null
  readonly registerStoreys: number | null
  readonly registerUse: Use | null
  readonly state: SheetState | null
  readonly finding: 'standing' | 'inaccessible' | 'not-a-building' | 'cleared' | null
  readonly use: UseOrUnknown | null
  readonly structure: StructureOrUnknown | null
  readonly yearFrom: number | null
  readonly yearTo: number | null
  readonly footprintM2: number | null
  readonly grossFloorAreaM2: number | null
  readonly floorAreaCv: number | null
  readonly condition: string
  readonly vacancy: string
  readonly isProtected: boolean
}

/** A recorded building of which floor area, use and the rest stand on a sheet. */
export interface RecordedRow extends LookRow {
  readonly state: SheetState
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly footprintM2: number
  readonly grossFloorAreaM2: number
  readonly floorAreaCv: number
}
