import type { AreaBasis } from '@/shared/compute/factors/vocabulary'

/** An area (or, on the basis `volume`, a volume) that says what it measures. */
export interface BasedArea {
  /** m², or m³ on the basis `volume`. */
  readonly amount: number
  readonly basis: AreaBasis
}
