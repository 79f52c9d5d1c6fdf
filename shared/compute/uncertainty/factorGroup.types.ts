/** Buildings that use one factor: its error is common to them all. */
export interface FactorGroup {
  readonly factorMeanKgPerM2: number
  /** Of the mean factor, shared [–]. */
  readonly factorCv: number
  readonly areasM2: readonly number[]
  /** Of each area, independent [–]; one for all, or one a building. */
  readonly areaCv: number | readonly number[]
}

/** Mean and spread of a mass; cv is 0 where the mean is. */
export interface MassMoments {
  readonly meanKg: number
  readonly sdKg: number
  readonly cv: number
}
