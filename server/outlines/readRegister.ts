import type { AttributeMapping, RegisterAttributes } from '@/shared/schemas/outline'
import { typedText } from '@/shared/schemas/primitives'
import type { Attributes, AttributeValue } from './outlines.types'
import { readHeightM, readStoreys, readUse, readYear } from './readRegisterValue'

/** What the register says of one outline under a mapping. */
export interface RegisterEntry extends RegisterAttributes {
  readonly reference: string | null
  readonly street: string | null
  readonly houseNumber: string | null
}

/** Shorter than the schema allows, so that a count fits behind a reference that comes twice. */
const REFERENCE_LENGTH = 70

type OurName = keyof AttributeMapping
const readers: { readonly [Name in OurName]: (value: AttributeValue) => RegisterEntry[Name] | undefined } = {
  reference: (value) => readText(value, REFERENCE_LENGTH),
  street: (value) => readText(value, 120),
  houseNumber: (value) => readText(value, 20),
  year: readYear,
  storeys: readStoreys,
  heightM: readHeightM,
  use: readUse,
}
export const OUR_NAMES = Object.keys(readers) as OurName[]

/**
 * Reads the attributes of one feature under a mapping. A value that cannot be used is left empty and counted.
 *
 * @param onUnreadable called with our name of each value that was there and could not be used
 */
export function readRegister(
  attributes: Attributes,
  mapping: AttributeMapping,
  onUnreadable: (name: OurName) => void,
): RegisterEntry {
  const read = <Name extends OurName>(name: Name): RegisterEntry[Name] | null => {
    const theirName = mapping[name]
    const value = theirName === null ? undefined : attributes[theirName]
    if (value === undefined) return null
    const readable = readers[name](value)
    if (readable === undefined) onUnreadable(name)
    return readable ?? null
  }
  return {
    reference: read('reference'),
    street: read('street'),
    houseNumber: read('houseNumber'),
    year: read('year'),
    storeys: read('storeys'),
    heightM: read('heightM'),
    use: read('use'),
  }
}

/** Whether a value can be used under one of our names. */
export function isReadableAs(name: OurName, value: AttributeValue): boolean {
  return readers[name](value) !== undefined
}

function readText(value: AttributeValue, maxLength: number): string | undefined {
  const text = typedText(maxLength).min(1).safeParse(String(value))
  return text.success ? text.data : undefined
}
