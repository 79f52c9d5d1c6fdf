import { describe, expect, it } from 'vitest'
import type { WasteLine } from '@/shared/api/publications'
import { capacityYears } from './capacityYears'
import { codeTotals } from './codeTotals'
import { recoveryOf, recoveryRows } from './recoveryRows'

const line = (year: number, code: string, likely: number, isHazardous = false): WasteLine => ({
  year,
  code,
  text: code,
  isHazardous,
  mirrorHazardousCode: null,
  materials: ['concrete'],
  massKg: { low: likely / 2, likely, high: likely * 2 },
  looseVolumeM3: { low: 1, likely: 1, high: 1 },
  loads: { low: 1, likely: 1, high: 1 },
})

describe('a plant beside the years ahead', () => {
  it('is exceeded by the likely mass, may be by the high one, and takes what is just as much', () => {
    const lines = [
      line(2029, '17 01 01', 40),
      line(2027, '17 01 01', 60),
      line(2027, '17 02 01', 41),
      line(2028, '17 01 01', 51),
    ]

    expect(capacityYears(lines, 100).map(({ year, likelyKg, verdict }) => [year, likelyKg, verdict])).toEqual([
      [2027, 101, 'exceeds'],
      [2028, 51, 'may-exceed'],
      [2029, 40, 'fits'],
    ])
    expect(capacityYears([line(2027, '17 01 01', 50)], 100)[0]?.verdict).toBe('fits')
  })
})

describe('what a yard recovers', () => {
  const totals = codeTotals([
    line(2027, '17 01 01', 800),
    line(2027, '17 02 01', 200),
    line(2027, '17 06 05*', 100, true),
  ])

  it('counts against the target without hazardous waste, and takes a share not said for nothing', () => {
    const rows = recoveryRows(totals, { '17 01 01': 0.9 })

    expect(rows.find(({ code }) => code === '17 02 01')?.share).toBeNull()
    expect(recoveryOf(rows)).toMatchObject({ share: 0.72, meetsTarget: true, countedKg: 1000, recoveredKg: 720 })
  })

  it('says nothing of the target when only hazardous waste comes', () => {
    expect(recoveryOf(recoveryRows(totals.slice(2), {}))).toBeNull()
  })
})
