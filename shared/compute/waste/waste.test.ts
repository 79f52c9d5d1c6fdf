import { readFileSync } from 'node:fs'
import path from 'node:path'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { MATERIALS } from '@/shared/compute/factors/vocabulary'
import { BULK_DENSITIES } from './bulkDensities'
import { containerLoads } from './containerLoads'
import { HAZARD_ROWS } from './hazardRows'
import { hazardSuspicions } from './hazardSuspicions'
import { looseVolume } from './looseVolume'
import { mirrorCodes } from './mirrorCodes'
import { normaliseWasteCode } from './normaliseWasteCode'
import { proposeWasteCode } from './proposeWasteCode'
import { recoveryShare } from './recoveryShare'
import { wasteCodeEntry } from './wasteCodeEntry'
import { WASTE_CODES } from './wasteCodes'
import { wasteLines } from './wasteLines'

const factorFile = (name: string) =>
  readFileSync(path.join(import.meta.dirname, '..', '..', '..', 'assets', 'factors', name), 'utf8')
const massKg = fc.double({ min: 0, max: 1e7, noNaN: true })

describe('the list of waste', () => {
  it('holds the same codes as the factor file', () => {
    const codes = [...factorFile('waste_codes.csv').matchAll(/^(\d\d \d\d \d\d\*?),/gm)].map(([, code]) => code)

    expect(WASTE_CODES.map(({ code }) => code)).toEqual(codes)
    expect(codes).toHaveLength(38)
  })

  it('knows hazardous entries by their asterisk and refuses a wrong one', () => {
    expect(wasteCodeEntry('17 06 05*').isHazardous).toBe(true)
    expect(wasteCodeEntry('170904').isHazardous).toBe(false)
    expect(() => wasteCodeEntry('17 06 05')).toThrow('unknown-code')
    expect(() => normaliseWasteCode('17 06')).toThrow('unknown-code')
  })

  it('pairs mirror entries in both directions', () => {
    for (const { code } of WASTE_CODES) {
      for (const counterpart of mirrorCodes(code)) {
        expect(counterpart.endsWith('*')).not.toBe(code.endsWith('*'))
        expect(mirrorCodes(counterpart)).toContain(code)
      }
    }
    expect(mirrorCodes('17 03 02')).toEqual(['17 03 01*'])
    expect(mirrorCodes('17 09 04')).toEqual(['17 09 01*', '17 09 02*', '17 09 03*'])
    expect(mirrorCodes('17 06 05*')).toEqual([])
  })
})

describe('a proposed code', () => {
  it('never moves to the hazardous side by itself, but asks', () => {
    const proposal = proposeWasteCode('timber', ['17 02 04*'])

    expect(proposal).toEqual({ code: '17 02 01', alternatives: ['17 02 04*'], mustAsk: true })
  })

  it('always asks for suspected asbestos cement', () => {
    expect(proposeWasteCode('asbestos-cement', [])).toMatchObject({ code: '17 06 05*', mustAsk: true })
  })

  it('exists for every material and stands in the list', () => {
    for (const material of MATERIALS) {
      const { code, alternatives } = proposeWasteCode(material, [])

      for (const named of [code, ...alternatives]) expect(wasteCodeEntry(named).code).toBe(named)
    }
  })
})

describe('waste lines', () => {
  it('keep the mass whatever the materials', () => {
    const mass = fc.record({ material: fc.constantFrom(...MATERIALS), massKg })
    fc.assert(
      fc.property(fc.array(mass, { maxLength: 30 }), (masses) => {
        const cameIn = masses.reduce((total, part) => total + part.massKg, 0)
        const lines = wasteLines(masses)
        const out = lines.reduce((total, line) => total + line.massKg, 0)

        expect(Math.abs(out - cameIn)).toBeLessThanOrEqual(1e-9 * Math.max(1, cameIn))
        for (const {
          looseVolumeM3: { low, likely, high },
        } of lines) {
          expect(low).toBeLessThanOrEqual(likely)
          expect(likely).toBeLessThanOrEqual(high)
        }
      }),
    )
  })

  it('say how much of a line is under suspicion', () => {
    const [line] = wasteLines([
      { material: 'timber', massKg: 100 },
      { material: 'timber', massKg: 40, suspectedCodes: ['17 02 04*'] },
    ])

    expect(line).toMatchObject({ code: '17 02 01', massKg: 140, suspectedKg: 40, mustAsk: true })
  })

  it('refuse a negative mass', () => {
    expect(() => wasteLines([{ material: 'steel', massKg: -1 }])).toThrow('negative-amount')
  })
})

describe('container loads', () => {
  const container = { volumeM3: 20, payloadKg: 12_000 }

  it('are limited by payload for concrete and by volume for timber', () => {
    expect(containerLoads(310_000, looseVolume(310_000, 1424), container)).toEqual({ loads: 26, limitedBy: 'payload' })
    expect(containerLoads(24_000, looseVolume(24_000, 237), container)).toEqual({ loads: 6, limitedBy: 'volume' })
  })

  it('do not add a container for the rounding of a division', () => {
    expect(containerLoads(0.3, 0, { volumeM3: 1, payloadKg: 0.1 }).loads).toBe(3)
    expect(containerLoads(0, 0, container)).toEqual({ loads: 0, limitedBy: 'nothing' })
    expect(containerLoads(1e-12, 0, container).loads).toBe(1)
  })

  it('hold what they carry and are not one too many', () => {
    fc.assert(
      fc.property(massKg, massKg, (mass, volumeM3) => {
        const { loads } = containerLoads(mass, volumeM3, container)

        expect(loads * container.payloadKg).toBeGreaterThanOrEqual(mass * (1 - 1e-8))
        expect(loads * container.volumeM3).toBeGreaterThanOrEqual(volumeM3 * (1 - 1e-8))
        expect(Math.min((loads - 1) * 20 - volumeM3, (loads - 1) * 12_000 - mass)).toBeLessThanOrEqual(0)
      }),
    )
  })

  it('refuse a container that holds nothing', () => {
    expect(() => containerLoads(1, 1, { volumeM3: 0, payloadKg: 1 })).toThrow('parameter-not-positive')
    expect(() => containerLoads(-1, 1, container)).toThrow('negative-amount')
    expect(() => looseVolume(1, 0)).toThrow('parameter-not-positive')
  })

  it('have an ordered bulk density for every material', () => {
    for (const { lowKgPerM3, likelyKgPerM3, highKgPerM3, source } of Object.values(BULK_DENSITIES)) {
      expect(lowKgPerM3).toBeLessThan(likelyKgPerM3)
      expect(likelyKgPerM3).toBeLessThan(highKgPerM3)
      expect(source).not.toBe('')
    }
  })
})

describe('the recovered share', () => {
  const rubble = { code: '17 01 01', massKg: 100, recoveredKg: 70 }

  it('meets the target at exactly 70 %', () => {
    expect(recoveryShare([rubble])).toMatchObject({ share: 0.7, meetsTarget: true })
  })

  it('leaves out hazardous waste and soil, and does not count energy', () => {
    const share = recoveryShare([
      rubble,
      { code: '17 05 04', massKg: 1000, recoveredKg: 1000 },
      { code: '17 06 05*', massKg: 50, recoveredKg: 0 },
      { code: '17 02 01', massKg: 100, recoveredKg: 100, isEnergyRecovery: true },
    ])

    expect(share).toMatchObject({ share: 0.35, meetsTarget: false, countedKg: 200 })
  })

  it('is refused where nothing counts or more came out than went in', () => {
    expect(() => recoveryShare([])).toThrow('undefined-statistic')
    expect(() => recoveryShare([{ ...rubble, recoveredKg: 101 }])).toThrow('share-out-of-range')
    expect(() => recoveryShare([{ ...rubble, massKg: -1 }])).toThrow('negative-amount')
  })
})

describe('suspicions', () => {
  const ids = (years: Parameters<typeof hazardSuspicions>[0]) =>
    hazardSuspicions(years).map(({ row, because }) => `${row.id} ${because}`)

  it('hold every row of the factor file', () => {
    const rows = factorFile('hazard_suspicions.csv').trim().split('\n').slice(1)

    expect(HAZARD_ROWS).toHaveLength(rows.length)
  })

  it('follow the year of construction', () => {
    const of1968 = ids({ construction: { fromYear: 1968, toYear: 1969 } })

    expect(of1968).toContain('pcb-sealants built-then')
    expect(of1968).not.toContain('asbestos-presumed-us built-then')
    expect(ids({ construction: { fromYear: 1968, toYear: 1969 }, country: 'US' })).toContain(
      'asbestos-presumed-us built-then',
    )
  })

  it('follow a refurbishment of the element', () => {
    const years = {
      construction: { fromYear: 2005, toYear: 2006 },
      refurbishments: [{ components: ['envelope'], years: { fromYear: 2010, toYear: 2011 } }],
    } as const

    expect(ids(years)).toContain('hbcd-foam built-then')
    expect(ids({ ...years, construction: { fromYear: 1880, toYear: 1881 } })).toContain('hbcd-foam refurbished-then')
  })

  it('stay open for an older building whose later works nobody knows, but not for its structure', () => {
    const old = ids({ construction: { fromYear: null, toYear: 1900 } })

    expect(old).toContain('asbestos-floor-tiles may-have-been-added')
    expect(old.some((id) => id.startsWith('asbestos-sprayed-steel'))).toBe(false)
  })

  it('all stand when the year is unknown', () => {
    expect(hazardSuspicions({ construction: 'unknown', country: 'US' })).toHaveLength(HAZARD_ROWS.length)
  })

  it('refuse an interval that ends before it starts', () => {
    expect(() => hazardSuspicions({ construction: { fromYear: 1990, toYear: 1980 } })).toThrow('interval-reversed')
  })
})
