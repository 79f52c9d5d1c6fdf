import type { EditionRows } from '@/shared/schemas/factorBook'
import { publishedIntensities } from './publishedIntensities'
import { publishedLifetimes } from './publishedLifetimes'
import { publishedDensities, publishedSuspicions, publishedWasteCodes } from './publishedWaste'

/** The factor book every organisation starts with: figures of `assets/factors`, each with its source. */
export function publishedEdition(): EditionRows {
  return {
    intensities: publishedIntensities(),
    lifetimes: publishedLifetimes(),
    densities: publishedDensities(),
    wasteCodes: publishedWasteCodes(),
    suspicions: publishedSuspicions(),
  }
}
