import type { StructureOrUnknown, UseOrUnknown } from '@/shared/compute/factors/vocabulary'
import type { Scenario } from '@/shared/schemas/run'
import type { SheetSlice } from '@/shared/schemas/sliceSheet'

/** Version of the computation; it changes when equal inputs would give other results. */
export const ENGINE_VERSION = '1.1.0'

/** A checked sheet as it stood when the run was started. */
export interface RunSheet {
  readonly buildingId: string
  readonly outlineId: string | null
  readonly blockId: string | null
  readonly label: string
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly yearFrom: number | null
  readonly yearTo: number | null
  readonly footprintM2: number
  readonly grossFloorAreaM2: number
  readonly floorAreaCv: number
  readonly isStoreysKnown: boolean
  readonly condition: string
  readonly vacancy: string
  readonly isProtected: boolean
  /** Only where a building has several uses or parts: what of its floor area has one use, structure and age, main part first. */
  readonly slices?: readonly SheetSlice[]
}

export interface FrameCounts {
  readonly frameCount: number
  readonly inaccessibleCount: number
  readonly notABuildingCount: number
  readonly clearedCount: number
  readonly outstandingCount: number
  readonly frameFootprintM2: number
}

/** All a run depends on, frozen at its start. */
export interface RunInputs {
  readonly engineVersion: string
  readonly surveyYear: number
  readonly seed: number
  readonly scenario: Scenario
  readonly editionId: string
  readonly editionSha256: string
  readonly frame: FrameCounts
  readonly sheets: readonly RunSheet[]
}
