/** The inputs of one check as they stand in the file: shapes differ by method and are read with the functions below. */
export type ConformanceInputs = Readonly<Record<string, unknown>>

/** A number that must be there. */
export function numberOf(inputs: ConformanceInputs, key: string): number {
  const value = inputs[key]
  if (typeof value !== 'number') throw new Error(`input "${key}" is not a number`)
  return value
}

/** A number that may be left out; null counts as left out. */
export function optionalNumberOf(inputs: ConformanceInputs, key: string): number | undefined {
  return inputs[key] === undefined || inputs[key] === null ? undefined : numberOf(inputs, key)
}

/** A text that must be there. */
export function textOf(inputs: ConformanceInputs, key: string): string {
  const value = inputs[key]
  if (typeof value !== 'string') throw new Error(`input "${key}" is not a text`)
  return value
}

/** A list that must be there. */
export function listOf(inputs: ConformanceInputs, key: string): readonly unknown[] {
  const value = inputs[key]
  if (!Array.isArray(value)) throw new Error(`input "${key}" is not a list`)
  return value
}

/** A list of numbers that must be there. */
export function numbersOf(inputs: ConformanceInputs, key: string): number[] {
  return listOf(inputs, key).map((value, index) => {
    if (typeof value !== 'number') throw new Error(`input "${key}[${index}]" is not a number`)
    return value
  })
}

/** A list of lists of numbers that must be there, such as positions. */
export function numberListsOf(inputs: ConformanceInputs, key: string): number[][] {
  return listOf(inputs, key).map((_, index) => numbersOf({ row: listOf(inputs, key)[index] }, 'row'))
}

/** An object that must be there. */
export function recordOf(inputs: ConformanceInputs, key: string): Readonly<Record<string, unknown>> {
  const value = inputs[key]
  if (!isRecord(value)) throw new Error(`input "${key}" is not an object`)
  return value
}

/** An object that is no list. */
export function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value)
}
