import { ComputeError } from '@/shared/compute/errors'
import { normaliseWasteCode } from './normaliseWasteCode'
import { WASTE_CODES, type WasteCode } from './wasteCodes'

/** An entry of the list with what its code says. */
export interface FoundWasteCode {
  readonly code: WasteCode
  readonly text: string
  readonly isHazardous: boolean
}

/**
 * Looks an entry up in chapter 17 of the List of Waste.
 *
 * @param code code in any spelling; the asterisk must be right, because it is part of the code
 * @returns the entry
 * @throws {ComputeError} `unknown-code` not in the list, or with a wrong asterisk
 * @see Commission Decision 2000/532/EC as amended.
 * @example
 * wasteCodeEntry('170201') // => { code: '17 02 01', text: 'wood', isHazardous: false }
 */
export function wasteCodeEntry(code: string): FoundWasteCode {
  const wanted = normaliseWasteCode(code)
  const entry = WASTE_CODES.find((known) => known.code === wanted)
  if (entry === undefined) throw new ComputeError('unknown-code', { code })
  return { code: entry.code, text: entry.text, isHazardous: wanted.endsWith('*') }
}
