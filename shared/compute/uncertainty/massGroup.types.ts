/** A material intensity whose relative error is common to every group that names its id; the means may differ. */
export interface SharedFactor {
  readonly factorId: string
  readonly meanKgPerM2: number
  /** Of the mean, shared [–], lognormal; the same wherever the id is named. */
  readonly sharedCv: number
}

/** A lifetime whose error is common to every group that names its id. */
export interface SharedLife {
  readonly lifeId: string
  /**
   * Chance of each building to come down [–] when the life is z standard errors longer or shorter, z standard normal;
   * as long as the areas.
   */
  readonly chancesAt: (z: number) => ArrayLike<number>
}

/** Buildings that share their factors and, where they may come down, the error of their life. */
export interface MassGroup {
  /** Independent of one another; of several materials all count together. */
  readonly factors: readonly SharedFactor[]
  readonly areasM2: ArrayLike<number>
  /** Measurement error of each area, independent [–]; one for all, or one a building. */
  readonly areaCv: number | ArrayLike<number>
  /** How much one building differs from the mean of its kind, independent [–]; 0 unless given. */
  readonly betweenBuildingsCv?: number
  /** What comes down instead of what stands: chances [–] without doubt, or those of a life in doubt. */
  readonly comingDown?: ArrayLike<number> | SharedLife
}
