import type { Component, Material } from './vocabulary'

/**
 * Where a material usually sits in a building, as shares of its mass [–] that add up to 1: common practice of
 * estimators, editable, and marked so wherever it is used.
 */
export const COMPONENT_SHARES: Readonly<Record<Material, Readonly<Partial<Record<Component, number>>>>> = {
  concrete: { structure: 0.95, 'fit-out': 0.05 },
  'masonry-units': { structure: 0.9, envelope: 0.06, 'fit-out': 0.04 },
  'mortar-plaster': { structure: 0.45, envelope: 0.2, 'fit-out': 0.35 },
  'natural-stone': { structure: 1 },
  ceramics: { roof: 0.6, 'fit-out': 0.4 },
  steel: { structure: 0.9, services: 0.1 },
  aluminium: { openings: 0.5, envelope: 0.5 },
  copper: { services: 0.9, roof: 0.1 },
  'other-metals': { services: 1 },
  timber: { structure: 0.7, roof: 0.06, openings: 0.08, 'fit-out': 0.16 },
  glass: { openings: 1 },
  gypsum: { 'fit-out': 1 },
  'mineral-insulation': { envelope: 0.6, roof: 0.4 },
  'plastic-insulation': { envelope: 0.7, roof: 0.3 },
  plastics: { services: 0.4, 'fit-out': 0.4, openings: 0.2 },
  bitumen: { roof: 1 },
  'asbestos-cement': { roof: 0.6, envelope: 0.4 },
  other: { structure: 1 },
}
