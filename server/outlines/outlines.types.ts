import type { AreaGeometry } from '@/shared/schemas/primitives'
import type { OutlineFault } from '@/shared/schemas/outline'

/** A feature as it stands in a file: nothing of it is checked. */
export interface RawFeature {
  readonly geometry: unknown
  readonly properties: Readonly<Record<string, unknown>>
}

/** Value of an attribute that a table could hold. */
export type AttributeValue = string | number | boolean
export type Attributes = Readonly<Record<string, AttributeValue>>

/** A feature that can become an outline: conforming rings, measured, with a point surely inside. */
export interface UsableFeature {
  /** Position in the file, from 0. */
  readonly index: number
  readonly geometry: AreaGeometry
  readonly footprintM2: number
  readonly innerPoint: readonly [longitude: number, latitude: number]
  readonly attributes: Attributes
}

export interface JudgedFeatures {
  readonly usable: readonly UsableFeature[]
  /** Faults without the reference, which is known only after an attribute was guessed for it. */
  readonly faults: readonly Omit<OutlineFault, 'reference'>[]
}
