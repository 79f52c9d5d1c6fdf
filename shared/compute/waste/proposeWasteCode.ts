import type { Material } from '@/shared/compute/factors/vocabulary'
import type { WasteCode } from './wasteCodes'

/** A proposal for the code of a fraction. Nobody but a person with a test result turns it into a declaration. */
export interface WasteCodeProposal {
  readonly code: WasteCode
  /** Hazardous codes (or the harmless one) the fraction may have to go under instead. */
  readonly alternatives: readonly WasteCode[]
  /** True when a suspicion stands: the screen must ask before any load is planned. */
  readonly mustAsk: boolean
}

interface Usual {
  readonly code: WasteCode
  readonly alternatives: readonly WasteCode[]
}

/** Usual code of each material kept apart, and the codes it may fall under when contaminated. */
const USUAL_CODES: Readonly<Record<Material, Usual>> = {
  concrete: { code: '17 01 01', alternatives: ['17 01 06*'] },
  'masonry-units': { code: '17 01 02', alternatives: ['17 01 06*'] },
  'mortar-plaster': { code: '17 01 07', alternatives: ['17 01 06*'] },
  'natural-stone': { code: '17 01 07', alternatives: ['17 01 06*'] },
  ceramics: { code: '17 01 03', alternatives: ['17 01 06*'] },
  steel: { code: '17 04 05', alternatives: ['17 04 09*'] },
  aluminium: { code: '17 04 02', alternatives: ['17 04 09*'] },
  copper: { code: '17 04 01', alternatives: ['17 04 09*'] },
  'other-metals': { code: '17 04 07', alternatives: ['17 04 09*'] },
  timber: { code: '17 02 01', alternatives: ['17 02 04*'] },
  glass: { code: '17 02 02', alternatives: ['17 02 04*'] },
  gypsum: { code: '17 08 02', alternatives: ['17 08 01*'] },
  'mineral-insulation': { code: '17 06 04', alternatives: ['17 06 01*', '17 06 03*'] },
  'plastic-insulation': { code: '17 06 04', alternatives: ['17 06 03*'] },
  plastics: { code: '17 02 03', alternatives: ['17 02 04*'] },
  bitumen: { code: '17 03 02', alternatives: ['17 03 01*', '17 03 03*'] },
  'asbestos-cement': { code: '17 06 05*', alternatives: ['17 09 04'] },
  other: { code: '17 09 04', alternatives: ['17 09 01*', '17 09 02*', '17 09 03*'] },
}

/**
 * Proposes a waste code for a material kept apart, and says whether a person must be asked.
 *
 * @param material material of the fraction
 * @param suspectedCodes hazardous codes that suspicions of the building point to
 * @returns the usual code, its alternatives (suspected ones first), and whether to ask; `asbestos-cement` always asks
 * @see Commission Decision 2000/532/EC as amended; assignment of materials is common practice and editable.
 * @example
 * proposeWasteCode('mineral-insulation', ['17 06 03*']) // => { code: '17 06 04', alternatives: ['17 06 03*', '17 06 01*'], mustAsk: true }
 * proposeWasteCode('concrete', []).mustAsk // => false
 */
export function proposeWasteCode(material: Material, suspectedCodes: readonly WasteCode[]): WasteCodeProposal {
  const { code, alternatives } = USUAL_CODES[material]
  const suspected = suspectedCodes.filter((suspicion) => suspicion !== code)
  return {
    code,
    alternatives: [...new Set([...suspected, ...alternatives])],
    mustAsk: suspected.length > 0 || material === 'asbestos-cement',
  }
}
