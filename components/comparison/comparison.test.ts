import { describe, expect, it } from 'vitest'
import { exampleResult, exampleRun } from '@/components/runs/runExample'
import { decadeRows } from './decadeRows'
import { differingInputs } from './differingInputs'

describe('differingInputs', () => {
  it('names first what differs, and holds what is equal', () => {
    const other = {
      ...exampleRun,
      editionNumber: 2,
      scenario: {
        ...exampleRun.scenario,
        lifetimeOverrides: [{ use: 'office' as const, model: 'weibull' as const, meanYears: 80, sdYears: 35 }],
      },
    }

    const rows = differingInputs([exampleRun, other])

    expect(rows.filter(({ differs }) => differs).map(({ input, values }) => [input, ...values])).toEqual([
      ['edition', '1', '2'],
      ['lifetimes', '–', 'office: weibull 80 ± 35'],
    ])
    expect(rows.find(({ input }) => input === 'district')?.values).toEqual(['Ropewalk', 'Ropewalk'])
  })
})

describe('decadeRows', () => {
  it('adds ten years up and leaves out what a run does not reach', () => {
    const years = Array.from({ length: 20 }, (_, place) => 2027 + place)
    const total = { meanKg: years.map((_, place) => place + 1), p10Kg: [], p90Kg: [] }
    const flows = { total, byMaterial: {} }
    const long = {
      ...exampleResult,
      yearsAhead: { ...exampleResult.yearsAhead, years, demolition: flows, refurbishment: flows },
    }

    const rows = decadeRows([long, exampleResult])

    expect(rows.map(({ fromYear, toYear, demolitionKg }) => [fromYear, toYear, ...demolitionKg])).toEqual([
      [2027, 2036, 55, null],
      [2037, 2046, 155, null],
    ])
  })
})
