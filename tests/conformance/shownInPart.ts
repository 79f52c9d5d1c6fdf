import { isRecord } from './inputs'

type Series = ArrayLike<number>

/**
 * A computed series or table of which a check shows only a part, without saying in its inputs which: the part is
 * picked out of the whole when the expected figures are known.
 */
export class ShownInPart {
  constructor(readonly figuresFor: (expected: unknown) => unknown) {}
}

/** A series that runs on past what a check shows. */
export function firstOf(series: Series): ShownInPart {
  return new ShownInPart((expected) => Array.from(series).slice(0, lengthOf(expected) ?? series.length))
}

/** Rows of a table that a check looks up by a key of theirs, such as the year; `usual` keys where it names none. */
export function rowsBy(key: string, usual: readonly number[], rowAt: (at: number) => object): ShownInPart {
  return new ShownInPart((expected) => {
    const named = Array.isArray(expected) ? expected.map((row) => (isRecord(row) ? row[key] : undefined)) : []
    const isNamed = named.length > 0 && named.every((at) => typeof at === 'number')
    const places: readonly number[] = isNamed ? named : usual
    return places.map((at) => ({ [key]: at, ...rowAt(at) }))
  })
}

/** Figures beside series by year that a check shows at chosen years, at the `usual` ones where it names none. */
export function atYears(
  series: Readonly<Record<string, Series>>,
  usual: readonly number[],
  figures: Readonly<Record<string, unknown>> = {},
): ShownInPart {
  return new ShownInPart((expected) => {
    const asked = isRecord(expected) ? expected : {}
    const years = numbersIn(asked.years) ?? usual
    const shown = Object.entries(series).map(([name, values]): [string, number[]] => {
      const length = lengthOf(asked[name])
      const isSampled = length === undefined || length === years.length
      return [name, isSampled ? years.map((year) => values[year] ?? NaN) : Array.from(values).slice(0, length)]
    })
    return { ...figures, years: [...years], ...Object.fromEntries(shown) }
  })
}

function lengthOf(value: unknown): number | undefined {
  return Array.isArray(value) ? value.length : undefined
}

function numbersIn(value: unknown): number[] | undefined {
  if (!Array.isArray(value)) return undefined
  const numbers = value.filter((entry) => typeof entry === 'number')
  return numbers.length === value.length ? numbers : undefined
}
