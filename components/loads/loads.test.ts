import { describe, expect, it } from 'vitest'
import type { WasteLine } from '@/shared/api/publications'
import { codeTotals, linesBetween } from './codeTotals'
import { loadCsvRows } from './loadCsvRows'

const line = (year: number, code: string, likely: number): WasteLine => ({
  year,
  code,
  text: code === '17 02 01' ? 'wood' : 'concrete',
  isHazardous: false,
  mirrorHazardousCode: code === '17 02 01' ? '17 02 04*' : null,
  materials: [code === '17 02 01' ? 'timber' : 'concrete'],
  massKg: { low: likely / 2, likely, high: likely * 2 },
  looseVolumeM3: { low: 1, likely: 2, high: 3 },
  loads: { low: 1, likely: 1, high: 2 },
})
const lines = [
  line(2027, '17 02 01', 1000.25),
  line(2027, '17 01 01', 9000),
  line(2028, '17 02 01', 2000),
  line(2040, '17 02 01', 5000),
]

describe('codeTotals', () => {
  it('adds the years of each code up and keeps the codes in order', () => {
    const totals = codeTotals(linesBetween(lines, 2027, 2028))

    expect(totals.map(({ code, massKg, loads }) => [code, massKg.likely, loads.high])).toEqual([
      ['17 01 01', 9000, 2],
      ['17 02 01', 3000.25, 4],
    ])
  })
})

describe('loadCsvRows', () => {
  it('writes all digits and the question of the second code', () => {
    expect(loadCsvRows(lines.slice(0, 1))[1]).toEqual([
      2027,
      '17 02 01',
      'wood',
      'no',
      '17 02 04*',
      'timber',
      500.125,
      1000.25,
      2000.5,
      1,
      2,
      3,
      1,
      1,
      2,
    ])
  })

  it('leaves the year of a total empty', () => {
    expect(loadCsvRows(codeTotals(lines))[1]?.[0]).toBeNull()
  })
})
