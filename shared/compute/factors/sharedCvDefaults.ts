import type { ArchetypeAttribute } from './intensity.types'
import type { Material } from './vocabulary'

/** Error of a mean factor by material, as coefficient of variation [–]; common practice, editable. */
export const DEFAULT_SHARED_CV: Readonly<Record<Material, number>> = {
  concrete: 0.22,
  'masonry-units': 0.25,
  'mortar-plaster': 0.25,
  'natural-stone': 0.25,
  ceramics: 0.25,
  steel: 0.3,
  aluminium: 0.5,
  copper: 0.5,
  'other-metals': 0.5,
  timber: 0.3,
  glass: 0.25,
  gypsum: 0.4,
  'mineral-insulation': 0.5,
  'plastic-insulation': 0.5,
  plastics: 0.6,
  bitumen: 0.5,
  'asbestos-cement': 0.6,
  other: 0.6,
}

/** Further error when an attribute is not known or not distinguished [–]; common practice, editable. */
export const POOLING_CV: Readonly<Record<ArchetypeAttribute, number>> = { structure: 0.35, period: 0.2, use: 0.15 }
