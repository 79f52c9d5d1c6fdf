import type {
  AreaBasis,
  Component,
  Material,
  PeriodIdOrUnknown,
  Provenance,
  Structure,
  StructureOrUnknown,
  Use,
  UseOrUnknown,
} from './vocabulary'

/** Kind of building a factor is looked up for. */
export interface ArchetypeKey {
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly periodId: PeriodIdOrUnknown
}

/** Attributes of an archetype by which factors differ. */
export type ArchetypeAttribute = 'use' | 'structure' | 'period'

/** One figure of a factor book: kilograms of a material per unit of area of a kind of building. */
export interface IntensityFigure {
  readonly rowId: string
  /** Rows taken from one published figure share its error fully. */
  readonly figureId: string
  readonly use: Use | 'all'
  readonly structure: Structure | 'all'
  /** Id of a construction period, or `all`. */
  readonly period: string
  readonly material: Material
  /** `whole`: the whole building, not split by component. */
  readonly component: Component | 'whole'
  readonly areaBasis: AreaBasis
  /** Both null: not reported, which is not zero. */
  readonly meanKgPerM2: number | null
  readonly medianKgPerM2: number | null
  /** True: present, too little to weigh. */
  readonly isTrace?: boolean
  readonly gsdBetweenBuildings: number | null
  /** Coefficient of variation of the mean, shared by all buildings that use it. */
  readonly sharedCv: number
  readonly sampleCount: number | null
  readonly source: string
  readonly provenance: Provenance
}

/** The figure of one component. */
export interface IntensityPart {
  readonly component: Component | 'whole'
  readonly meanKgPerM2: number
  readonly sharedCv: number
  /** Spread of single buildings around the mean; null where the source does not say. */
  readonly betweenBuildingsCv: number | null
  readonly rowIds: readonly string[]
  readonly figureIds: readonly string[]
  readonly provenances: readonly Provenance[]
}

/** What a factor book says of one material in one kind of building. Missing, trace and zero are three answers. */
export type Intensity =
  | {
      readonly kind: 'known'
      readonly parts: readonly IntensityPart[]
      readonly meanKgPerM2: number
      readonly sharedCv: number
      readonly areaBasis: AreaBasis
      /** False: only a whole-building figure, so nothing can be renewed on its own. */
      readonly isSplit: boolean
      /** Attributes the figure does not distinguish although it would matter; each widens the error. */
      readonly pooledOver: readonly ArchetypeAttribute[]
    }
  | { readonly kind: 'trace' }
  | { readonly kind: 'missing'; readonly reason: 'no-row' | 'not-reported' }
