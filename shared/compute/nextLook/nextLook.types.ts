import type { Material, StructureOrUnknown, UseOrUnknown } from '@/shared/compute/factors/vocabulary'

/** What a look can settle, each considered apart. */
export const LOOK_ATTRIBUTES = ['floorArea', 'constructionYear', 'structure', 'use'] as const
export type LookAttribute = (typeof LOOK_ATTRIBUTES)[number]

/** The figure that looks are to make surer. */
export interface LookFigure {
  /** `all`: every material together. */
  readonly material: Material | 'all'
  /** Last year of the demolition that counts, from the year after the survey on; null: what stands today. */
  readonly byYear: number | null
}

/** What is known of a building's kind; null: not known. */
export interface KnownKind {
  readonly use: UseOrUnknown | null
  readonly structure: StructureOrUnknown | null
  readonly yearFrom: number | null
  readonly yearTo: number | null
}

/** A recorded building of the district whose kind is known, or several alike. */
export interface Sighting {
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly constructionYear: number
  readonly count: number
}

/** One answer a look may give, and how probable it is [–]. */
export interface PossibleKind {
  readonly weight: number
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly constructionYear: number
}

/** What a square metre of a kind contributes to the figure. */
export interface KindFigure {
  /** Mean content of the counted materials [kg/m²]. */
  readonly contentKgPerM2: number
  /** Shared errors by factor [kg/m²]; one entry an id. */
  readonly factors: readonly { readonly factorId: string; readonly sdKgPerM2: number }[]
  /** Variance from building to building [kg²/m⁴]. */
  readonly betweenVariance: number
  /** Chance to be counted [–]: 1 for what stands, else to come down by the year, under three lives. */
  readonly chance: number
  readonly chanceIfShorter: number
  readonly chanceIfLonger: number
  /** The lifetime whose error all of its buildings share; null where no life matters. */
  readonly lifetimeId: string | null
}

/** A possible kind with its figures. */
export interface WeighedKind extends PossibleKind {
  readonly figure: KindFigure
}

/** A building of the frame as far as it is known. */
export interface DoubtfulBuilding {
  readonly buildingId: string
  /** Expected gross floor area [m²], > 0. */
  readonly floorAreaM2: number
  /** Its coefficient of variation now, and after a look [–]. */
  readonly floorAreaCv: number
  readonly floorAreaCvAfter: number
  readonly kinds: readonly WeighedKind[]
}

/** Expected fall of the variance [kg²] when everything is settled, and when one attribute alone is. */
export interface ExpectedFall {
  readonly wholeKg2: number
  readonly byAttributeKg2: Readonly<Record<LookAttribute, number>>
}
