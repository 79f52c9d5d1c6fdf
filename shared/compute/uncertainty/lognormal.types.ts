/** A lognormal law by mean μ and standard deviation σ of the logarithm [–]. */
export interface Lognormal {
  readonly logMean: number
  readonly logSd: number
}
