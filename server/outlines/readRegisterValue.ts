import { USES } from '@/shared/compute/factors/vocabulary'
import type { RegisterAttributes } from '@/shared/schemas/outline'
import { calendarYear } from '@/shared/schemas/primitives'
import type { AttributeValue } from './outlines.types'
import { meantUse } from './meantUse'

type Use = (typeof USES)[number]

/**
 * Construction year of a register: a whole number, digits, or the year of an ISO date.
 *
 * @returns undefined when the value means no year from 1000 to 2300
 */
export function readYear(value: AttributeValue): RegisterAttributes['year'] | undefined {
  const text = String(value).trim()
  const digits = /^(\d{4})(?:\.0+)?$/.exec(text)?.[1] ?? /^(\d{4})-\d{2}(?:-\d{2})?(?:T.*)?$/.exec(text)?.[1]
  const year = calendarYear.safeParse(Number(digits))
  return year.success ? year.data : undefined
}

/** Storeys above ground, 0.5 to 150; a comma may stand for the decimal point. */
export function readStoreys(value: AttributeValue): number | undefined {
  return within(readNumber(value), 0.5, 150)
}

/** Height in metres, above 0 to 900; the unit may stand behind it. */
export function readHeightM(value: AttributeValue): number | undefined {
  const height = within(
    readNumber(typeof value === 'string' ? value.replace(/\s*m(etres?|eters?)?\.?$/i, '') : value),
    0,
    900,
  )
  return height === 0 ? undefined : height
}

/** Use, from our own word or the usual words of registers in several languages. */
export function readUse(value: AttributeValue): Use | undefined {
  const text = String(value).trim().toLowerCase()
  return USES.find((use) => use === text) ?? meantUse(text)
}

function readNumber(value: AttributeValue): number {
  if (typeof value === 'number') return value
  const text = String(value).trim().replace(',', '.')
  return /^-?\d+(\.\d+)?$/.test(text) ? Number(text) : Number.NaN
}

function within(value: number, least: number, most: number): number | undefined {
  return value >= least && value <= most ? value : undefined
}
