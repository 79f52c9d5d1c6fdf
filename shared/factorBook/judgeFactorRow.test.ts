import { describe, expect, it } from 'vitest'
import { judgeAmongRows } from './judgeAmongRows'
import { judgeFactorRow } from './judgeFactorRow'

const sourced = { source: 'an invented weighbridge', provenance: 'published', note: null }
const factor = {
  material: 'timber',
  structure: 'timber-frame',
  use: 'all',
  period: 'all',
  component: 'structure',
  region: 'all',
  areaBasis: 'GFA',
  medianKgPerM2: 60,
  meanKgPerM2: 70,
  p10KgPerM2: 20,
  p90KgPerM2: 110,
  gsdBetweenBuildings: 1.6,
  sharedCv: 0.3,
  sampleCount: 40,
  ...sourced,
}
const life = { use: 'all', structure: 'all', component: 'building', model: 'weibull', meanYears: 130, sdYears: 60 }
const faults = (change: object) => judgeFactorRow('intensities', { ...factor, ...change }).map(({ code }) => code)
const lifeFaults = (change: object) =>
  judgeFactorRow('lifetimes', { ...life, sharedCv: 0.2, ...sourced, ...change }).map(({ code }) => code)

describe('a row of the factor book', () => {
  it('holds when nothing is wrong, also when its figures are missing', () => {
    expect(faults({})).toEqual([])
    expect(faults({ medianKgPerM2: null, meanKgPerM2: null, p10KgPerM2: null, p90KgPerM2: null })).toEqual([])
    expect(lifeFaults({})).toEqual([])
  })

  it('has a fault of its own for each kind of bad input', () => {
    expect(faults({ areaBasis: '' })).toEqual(['basisMissing'])
    expect(faults({ areaBasis: 'NFA' })).toEqual(['basisNotGross'])
    expect(faults({ meanKgPerM2: -1 })).toEqual(['negative'])
    expect(faults({ meanKgPerM2: 70_000 })).toEqual(['tooLarge'])
    expect(faults({ meanKgPerM2: '70 kg' })).toEqual(['notANumber'])
    expect(faults({ sampleCount: 1.5 })).toEqual(['notWhole'])
    expect(faults({ gsdBetweenBuildings: 0.5 })).toEqual(['tooSmall'])
    expect(faults({ p10KgPerM2: 120 })).toEqual(['orderReversed'])
    expect(faults({ period: '1940-1950' })).toEqual(['periodOverlaps'])
    expect(faults({ material: 'jelly', source: ' ' })).toEqual(['notAChoice', 'missing'])
    expect(lifeFaults({ meanYears: 0 })).toEqual(['zeroLife'])
    expect(lifeFaults({ model: 'fixed' })).toEqual(['lifeImpossible'])
  })

  it('names the periods that a span of years reaches into, both ends counted', () => {
    expect(judgeFactorRow('intensities', { ...factor, period: '1945–1961' })[0]?.parts['periods']).toBe(
      '1919-1945, 1946-1960, 1961-1975',
    )
  })

  it('takes the asterisk of a European code at its word, and leaves other lists alone', () => {
    const code = (change: object) =>
      judgeFactorRow('wasteCodes', { code: '17 01 01', isHazardous: false, text: 'concrete', ...sourced, ...change })

    expect(code({})).toEqual([])
    expect(code({ isHazardous: true }).map(({ field }) => field)).toEqual(['isHazardous'])
    expect(code({ mirrorHazardousCode: '17 01 06' })[0]?.code).toBe('mirrorHarmless')
    expect(code({ code: 'K-12', isHazardous: true })).toEqual([])
  })

  it('stands beside others only when it says something of its own', () => {
    const among = (row: object, other: object) =>
      judgeAmongRows('intensities', { ...factor, ...row }, [{ ...factor, ...other }]).map(({ code }) => code)

    expect(among({ region: 'north' }, {})).toEqual(['duplicate'])
    expect(among({ component: 'roof' }, {})).toEqual([])
    expect(among({ component: 'whole' }, {})).toEqual(['wholeBesideParts'])
    expect(among({ component: 'whole', period: '1919-1945' }, {})).toEqual([])
  })

  it('of suspicions has years that do not overlap those of the same element', () => {
    const element = { substance: 'asbestos', component: 'roof', element: 'sheets' }
    const among = (fromYear: number | null, toYear: number | null) =>
      judgeAmongRows('suspicions', { ...element, fromYear, toYear }, [{ ...element, fromYear: 1950, toYear: 1980 }])

    expect(among(1981, null)).toEqual([])
    expect(among(null, 1950).map(({ code }) => code)).toEqual(['yearsOverlap'])
  })
})
