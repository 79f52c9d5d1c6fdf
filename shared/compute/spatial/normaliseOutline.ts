import { normaliseRing, type RingChange } from './normaliseRing'
import type { Outline, Position } from './spatial.types'

/** A conforming outline and what was changed in any of its rings. */
export interface NormalisedOutline {
  readonly outline: Outline
  readonly changes: readonly RingChange[]
}

/**
 * The rings of a polygon as RFC 7946 wants them: the first is the exterior, the others are holes.
 *
 * @param rings the `coordinates` of a GeoJSON polygon
 * @param near a position of the district [°], to recognise swapped coordinates
 * @returns the outline and the changes made, each named once
 * @throws {ComputeError} as {@link normaliseRing}; `ring-too-short` when there is no ring
 * @see RFC 7946 (2016). The GeoJSON format, section 3.1.6.
 * @example
 * normaliseOutline([[[0, 0], [0, 1], [1, 1], [1, 0], [0, 0]]]).changes // => ['reversed']
 */
export function normaliseOutline(
  rings: readonly (readonly (readonly number[])[])[],
  near?: Position,
): NormalisedOutline {
  const [first = [], ...others] = rings
  const exterior = normaliseRing(first, { role: 'exterior', near })
  const holes = others.map((ring) => normaliseRing(ring, { role: 'hole', near }))
  return {
    outline: { exterior: exterior.ring, holes: holes.map(({ ring }) => ring) },
    changes: [...new Set([exterior, ...holes].flatMap(({ changes }) => changes))],
  }
}
