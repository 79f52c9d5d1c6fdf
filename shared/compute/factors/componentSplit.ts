import { ComputeError } from '@/shared/compute/errors'
import { COMPONENT_SHARES } from './componentShares'
import { COMPONENTS, type Component, type Material } from './vocabulary'

/** A whole-building figure laid out over the components. */
export interface ComponentSplit {
  readonly parts: readonly { readonly component: Component; readonly kgPerM2: number }[]
  /** How the figure was laid out; the screen says so. */
  readonly basis: 'not-split' | 'common-practice-shares'
}

/**
 * Lays a whole-building figure over the components of a building. Not split, all of it counts as structure and no
 * refurbishment can be computed for it; by shares it can, at the price of an assumption.
 *
 * @param material material of the figure
 * @param wholeKgPerM2 figure for the whole building [kg/m²], ≥ 0
 * @param basis how to lay it out
 * @returns parts in the order of the components; they add up to the figure
 * @throws {ComputeError} `negative-amount`
 * @see shares: common practice, COMPONENT_SHARES.
 * @example
 * componentSplit('timber', 100, 'not-split').parts // => [{ component: 'structure', kgPerM2: 100 }]
 * componentSplit('mineral-insulation', 10, 'common-practice-shares').parts // => [{ component: 'envelope', kgPerM2: 6 }, { component: 'roof', kgPerM2: 4 }]
 */
export function componentSplit(
  material: Material,
  wholeKgPerM2: number,
  basis: ComponentSplit['basis'],
): ComponentSplit {
  if (!(wholeKgPerM2 >= 0)) throw new ComputeError('negative-amount', { material, wholeKgPerM2 })
  if (basis === 'not-split') return { parts: [{ component: 'structure', kgPerM2: wholeKgPerM2 }], basis }
  const shares = COMPONENT_SHARES[material]
  const parts = COMPONENTS.flatMap((component) => {
    const share = shares[component]
    return share === undefined ? [] : [{ component, kgPerM2: share * wholeKgPerM2 }]
  })
  return { parts, basis }
}
