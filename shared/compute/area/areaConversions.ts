import type { Provenance, Use } from '@/shared/compute/factors/vocabulary'

/** Ratios to turn one area basis into another; every figure is an editable default. */
export interface AreaRatios {
  /** Net over gross floor area [–]. */
  readonly netPerGross: number
  /** Usable over net floor area [–]. */
  readonly usablePerNet: number
  /** Internal over gross floor area [–]: what the outer walls leave. */
  readonly internalPerGross: number
  /** Floor level to floor level [m]. */
  readonly storeyHeightM: number
  readonly provenance: Provenance
}

const dwelling = { usablePerNet: 0.8, internalPerGross: 0.9, provenance: 'common-practice' } as const
const hall = { usablePerNet: 0.85, internalPerGross: 0.95, provenance: 'common-practice' } as const

/** Default ratios by use: middle of the ranges surveyors work with. */
export const AREA_RATIOS: Readonly<Record<Use, AreaRatios>> = {
  'single-family': { ...dwelling, netPerGross: 0.8, storeyHeightM: 2.8 },
  terraced: { ...dwelling, netPerGross: 0.8, storeyHeightM: 2.8 },
  'multi-family': { ...dwelling, netPerGross: 0.82, storeyHeightM: 2.8 },
  office: { ...dwelling, netPerGross: 0.85, storeyHeightM: 3.5 },
  retail: { ...dwelling, netPerGross: 0.88, storeyHeightM: 4.2 },
  public: { ...dwelling, netPerGross: 0.88, storeyHeightM: 3.5 },
  hotel: { ...dwelling, netPerGross: 0.82, storeyHeightM: 3.2 },
  industrial: { ...hall, netPerGross: 0.91, storeyHeightM: 6.5 },
  warehouse: { ...hall, netPerGross: 0.92, storeyHeightM: 6.5 },
  agricultural: { ...hall, netPerGross: 0.92, storeyHeightM: 5 },
  ancillary: { ...hall, netPerGross: 0.9, storeyHeightM: 2.6 },
  other: { ...dwelling, netPerGross: 0.84, storeyHeightM: 3.2 },
}
