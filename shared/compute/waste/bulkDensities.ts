import type { Material, Provenance } from '@/shared/compute/factors/vocabulary'

/** Loose bulk density of a kept-apart fraction, for planning containers. */
export interface BulkDensity {
  readonly lowKgPerM3: number
  readonly likelyKgPerM3: number
  readonly highKgPerM3: number
  readonly source: string
  readonly provenance: Provenance
}

const STATE_TABLE =
  'state agency table of weights and volumes for project estimates (California, solid-waste clean-up programme), lb/yd3 converted'
const BUILDERS_STUDY =
  'National Association of Home Builders Research Center, residential construction waste study (1995), lb/yd3 converted'
const GUIDE_2009 = 'USGBC LEED reference guide 2009, solid-waste conversion factors, lb/yd3 converted'
const HIRE_FIRMS = 'ranges used by container hire firms'

/** Published tables differ by ±40 % for one material; a single figure is given that spread. */
const USUAL_SPREAD = 0.4

function around(likelyKgPerM3: number, source: string, provenance: Provenance): BulkDensity {
  const [lowKgPerM3, highKgPerM3] = [likelyKgPerM3 * (1 - USUAL_SPREAD), likelyKgPerM3 * (1 + USUAL_SPREAD)]
  return { lowKgPerM3, likelyKgPerM3, highKgPerM3, source, provenance }
}

function between(lowKgPerM3: number, highKgPerM3: number, source: string, provenance: Provenance): BulkDensity {
  return { lowKgPerM3, likelyKgPerM3: (lowKgPerM3 + highKgPerM3) / 2, highKgPerM3, source, provenance }
}

const lightMetal = between(89, 593, `${BUILDERS_STUDY} (low); ${GUIDE_2009} (high)`, 'published')

/** Editable defaults by material; a yard replaces them by what its own weighbridge says. */
export const BULK_DENSITIES: Readonly<Record<Material, BulkDensity>> = {
  concrete: around(1424, STATE_TABLE, 'published'),
  'masonry-units': between(593, 831, `${BUILDERS_STUDY} (low); ${GUIDE_2009} (high)`, 'published'),
  'mortar-plaster': around(831, `mixed mineral rubble; ${GUIDE_2009}`, 'published'),
  'natural-stone': around(1543, `crushed stone, loose and dry; ${STATE_TABLE}`, 'published'),
  ceramics: between(900, 1300, HIRE_FIRMS, 'from-memory'),
  steel: lightMetal,
  aluminium: lightMetal,
  copper: lightMetal,
  'other-metals': lightMetal,
  timber: between(158, 237, `${BUILDERS_STUDY} (low); ${STATE_TABLE} (high)`, 'published'),
  glass: between(900, 1300, HIRE_FIRMS, 'from-memory'),
  gypsum: between(237, 297, `${BUILDERS_STUDY} (low); ${GUIDE_2009} (high)`, 'published'),
  'mineral-insulation': between(30, 120, HIRE_FIRMS, 'from-memory'),
  'plastic-insulation': between(10, 40, HIRE_FIRMS, 'from-memory'),
  plastics: around(89, BUILDERS_STUDY, 'published'),
  bitumen: between(1200, 1500, HIRE_FIRMS, 'from-memory'),
  'asbestos-cement': between(800, 1200, `sheets, double wrapped; ${HIRE_FIRMS}`, 'from-memory'),
  other: between(600, 1100, 'mixed demolition waste with rubble', 'common-practice'),
}
