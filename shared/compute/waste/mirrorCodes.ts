import { WASTE_CODES, type WasteCode } from './wasteCodes'
import { wasteCodeEntry } from './wasteCodeEntry'

const OTHER_THAN = /other than those mentioned in (.+)$/

/**
 * Counterparts of a mirror entry: the list says "… other than those mentioned in …" on the harmless side.
 *
 * @param code code in any spelling
 * @returns for a hazardous code its non-hazardous counterparts, for a non-hazardous one its hazardous counterparts;
 *   empty for absolute entries
 * @throws {ComputeError} `unknown-code`
 * @remarks Which of the two holds is found by a test of the waste, never by this product.
 * @see Commission Decision 2000/532/EC as amended; wording of the entries of chapter 17.
 * @example
 * mirrorCodes('17 06 03*') // => ['17 06 04']
 * mirrorCodes('17 06 04') // => ['17 06 01*', '17 06 03*']
 * mirrorCodes('17 01 01') // => []
 */
export function mirrorCodes(code: string): readonly WasteCode[] {
  const entry = wasteCodeEntry(code)
  if (!entry.isHazardous) return hazardousSide(entry.text)
  return WASTE_CODES.filter(({ text }) => hazardousSide(text).includes(entry.code)).map((other) => other.code)
}

function hazardousSide(text: string): WasteCode[] {
  const [, mentioned = ''] = OTHER_THAN.exec(text) ?? []
  const digits = mentioned.match(/\d{2} \d{2} \d{2}/g) ?? []
  return WASTE_CODES.filter((entry) => digits.some((known) => entry.code === `${known}*`)).map((entry) => entry.code)
}
