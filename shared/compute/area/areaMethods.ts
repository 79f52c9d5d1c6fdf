/** How a floor area came to be known, best first. */
export const AREA_METHODS = ['plans', 'map-and-storeys', 'paced-or-taped', 'by-eye', 'imputed'] as const

export type AreaMethod = (typeof AREA_METHODS)[number]

/** Usual relative error of a floor area by its method, with the range surveyors quote. */
export interface AreaMethodError {
  readonly cv: number
  readonly lowCv: number
  readonly highCv: number
  readonly provenance: 'common-practice'
}

/** Coefficients of variation of single buildings, independent of each other; common practice, editable. */
export const AREA_METHOD_ERRORS: Readonly<Record<AreaMethod, AreaMethodError>> = {
  plans: { cv: 0.02, lowCv: 0.02, highCv: 0.02, provenance: 'common-practice' },
  'map-and-storeys': { cv: 0.065, lowCv: 0.05, highCv: 0.08, provenance: 'common-practice' },
  'paced-or-taped': { cv: 0.1, lowCv: 0.08, highCv: 0.12, provenance: 'common-practice' },
  'by-eye': { cv: 0.2, lowCv: 0.15, highCv: 0.25, provenance: 'common-practice' },
  imputed: { cv: 0.4, lowCv: 0.3, highCv: 0.5, provenance: 'common-practice' },
}
