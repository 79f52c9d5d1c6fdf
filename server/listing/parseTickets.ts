import Papa from 'papaparse'
import { unusable } from '@/server/errors'
import { ComputeError } from '@/shared/compute/errors'
import { wasteCodeEntry } from '@/shared/compute/waste/wasteCodeEntry'
import type { Fault } from '@/shared/schemas/problem'
import { calendarDay } from '@/shared/schemas/primitives'

/** One weighed load. */
export interface Ticket {
  readonly weighedOn: string
  readonly code: string
  readonly massKg: number
}

const COLUMNS = ['date', 'waste_code', 'mass_t'] as const
const KG_PER_T = 1_000
const HEAVIEST_LOAD_T = 60
const MOST_FAULTS = 50

/**
 * Reads weighbridge tickets from a CSV with the columns `date`, `waste_code` and `mass_t`; commas or semicolons.
 *
 * @returns one ticket a row, masses in kg
 * @throws {Refusal} `input-not-usable` with every fault by its row, when one row is not usable: nothing is taken then
 */
export function parseTickets(csv: string): Ticket[] {
  const { data, meta } = Papa.parse<Record<string, string>>(csv.replace(/^\uFEFF/, ''), {
    header: true,
    skipEmptyLines: 'greedy',
    transformHeader: (head) => head.trim().toLowerCase(),
    transform: (cell) => cell.trim(),
  })
  const missing = COLUMNS.filter((column) => !(meta.fields ?? []).includes(column))
  if (missing.length > 0) {
    throw refused([
      {
        pointer: '/body/csv',
        code: 'column-missing',
        detail: `The first row must name ${COLUMNS.join(', ')}; it lacks ${missing.join(', ')}.`,
      },
    ])
  }
  if (data.length === 0) {
    throw refused([{ pointer: '/body/csv', code: 'empty', detail: 'There is no row under the first one.' }])
  }
  const faults: Fault[] = []
  const tickets = data.flatMap((row, index) => {
    // the head is row 1 of the file
    const found = faultsOf(row, index + 2)
    faults.push(...found)
    return found.length > 0 ? [] : [ticketOf(row)]
  })
  if (faults.length > 0) throw refused(faults.slice(0, MOST_FAULTS))
  return tickets
}

function ticketOf(row: Record<string, string>): Ticket {
  const { code } = wasteCodeEntry(row.waste_code ?? '')
  return { weighedOn: row.date ?? '', code, massKg: numberOf(row.mass_t) * KG_PER_T }
}

function faultsOf(row: Record<string, string>, line: number): Fault[] {
  const massT = numberOf(row.mass_t)
  const checks: [boolean, (typeof COLUMNS)[number], string][] = [
    [calendarDay.safeParse(row.date).success, 'date', `"${row.date ?? ''}" is no day; write 2026-11-30.`],
    [isCode(row.waste_code), 'waste_code', `"${row.waste_code ?? ''}" is no code of chapter 17; write 17 01 02.`],
    [
      massT > 0 && massT <= HEAVIEST_LOAD_T,
      'mass_t',
      `"${row.mass_t ?? ''}" is no load in tonnes from 0 to ${HEAVIEST_LOAD_T}.`,
    ],
  ]
  return checks.flatMap(([isFine, column, detail]) =>
    isFine
      ? []
      : [{ pointer: `/body/csv/${line}/${column}`, code: 'cell-not-usable', detail: `Row ${line}: ${detail}` }],
  )
}

function isCode(text: string | undefined): boolean {
  try {
    wasteCodeEntry(text ?? '')
    return true
  } catch (error) {
    if (error instanceof ComputeError) return false
    throw error
  }
}

/** A decimal point or a decimal comma, no separators of thousands. */
function numberOf(text: string | undefined): number {
  return /^\d+([.,]\d+)?$/.test(text ?? '') ? Number((text ?? '').replace(',', '.')) : Number.NaN
}

const refused = (faults: Fault[]) =>
  unusable(
    'The tickets could not be read; nothing was taken and what you gave before stands. Mend the rows named and give the file again.',
    faults,
  )
