import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { AREA_BASES } from '@/shared/compute/factors/vocabulary'
import { AREA_RATIOS } from './areaConversions'
import { AREA_METHODS, AREA_METHOD_ERRORS } from './areaMethods'
import { convertArea } from './convertArea'
import { defaultAreaCv } from './defaultAreaCv'
import { grossFloorArea } from './grossFloorArea'
import { grossVolume } from './grossVolume'
import { storeysFromHeight } from './storeysFromHeight'
import { sumAreas } from './sumAreas'

const conversion = { ...AREA_RATIOS['multi-family'], levels: 4 }
const amount = fc.double({ min: 0, max: 1e6, noNaN: true })

describe('gross floor area', () => {
  it('counts a missing share as none', () => {
    expect(grossFloorArea({ footprintM2: 100, storeys: 2.5 })).toBe(250)
    expect(grossFloorArea({ footprintM2: 100, storeys: 2, basementShare: 0.5 })).toBe(250)
  })

  it('doubles with the footprint', () => {
    fc.assert(
      fc.property(
        amount,
        fc.integer({ min: 0, max: 40 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (footprintM2, storeys, atticShare) => {
          const single = grossFloorArea({ footprintM2, storeys, atticShare })

          expect(grossFloorArea({ footprintM2: 2 * footprintM2, storeys, atticShare })).toBeCloseTo(2 * single, 6)
        },
      ),
    )
  })

  it('refuses negative areas, negative storeys and shares out of range', () => {
    expect(() => grossFloorArea({ footprintM2: -1, storeys: 1 })).toThrow('negative-area')
    expect(() => grossFloorArea({ footprintM2: Number.NaN, storeys: 1 })).toThrow('negative-area')
    expect(() => grossFloorArea({ footprintM2: 1, storeys: -1 })).toThrow('parameter-out-of-range')
    expect(() => grossFloorArea({ footprintM2: 1, storeys: 1, atticShare: 1.1 })).toThrow('share-out-of-range')
    expect(() => grossFloorArea({ footprintM2: 1, storeys: 1, basementShare: -0.1 })).toThrow('share-out-of-range')
  })
})

describe('gross volume', () => {
  it('uses its own height below ground', () => {
    const extent = { footprintM2: 100, storeys: 1, basementShare: 1 }

    expect(grossVolume(extent, 3)).toBeCloseTo(540, 9)
    expect(grossVolume(extent, 3, 3)).toBeCloseTo(600, 9)
  })

  it('refuses a storey without height', () => {
    expect(() => grossVolume({ footprintM2: 1, storeys: 1 }, 0)).toThrow('parameter-not-positive')
  })
})

describe('area bases', () => {
  it('come back to the same amount', () => {
    fc.assert(
      fc.property(amount, fc.constantFrom(...AREA_BASES), fc.constantFrom(...AREA_BASES), (value, from, to) => {
        const there = convertArea({ amount: value, basis: from }, to, conversion)
        const back = convertArea(there, from, conversion)

        expect(there.basis).toBe(to)
        expect(Math.abs(back.amount - value)).toBeLessThanOrEqual(1e-12 * value + 1e-12)
      }),
    )
  })

  it('are never added unconverted', () => {
    const mixed = [
      { amount: 1, basis: 'GFA' },
      { amount: 1, basis: 'NFA' },
    ] as const

    expect(() => sumAreas(mixed)).toThrow('mixed-area-bases')
    expect(() => sumAreas([])).toThrow('empty-input')
    expect(() => sumAreas([{ amount: -1, basis: 'GFA' }])).toThrow('negative-area')
  })

  it('need the levels to go from or to the footprint', () => {
    const { levels: _levels, ...withoutLevels } = conversion

    expect(() => convertArea({ amount: 1, basis: 'footprint' }, 'GFA', withoutLevels)).toThrow('mixed-area-bases')
    expect(convertArea({ amount: 100, basis: 'footprint' }, 'GFA', conversion).amount).toBe(400)
  })

  it('shrink from gross to internal to net to usable, for every use', () => {
    for (const ratios of Object.values(AREA_RATIOS)) {
      const amounts = (['GFA', 'internal', 'NFA', 'usable'] as const).map(
        (basis) => convertArea({ amount: 100, basis: 'GFA' }, basis, ratios).amount,
      )

      expect(amounts).toEqual([...amounts].sort((one, other) => other - one))
    }
  })
})

it('gives each way of measuring a default error inside its range, growing from plans to imputation', () => {
  const defaults = AREA_METHODS.map(defaultAreaCv)

  expect(defaults).toEqual([...defaults].sort((one, other) => one - other))
  for (const { cv, lowCv, highCv } of Object.values(AREA_METHOD_ERRORS)) {
    expect(cv).toBeGreaterThanOrEqual(lowCv)
    expect(cv).toBeLessThanOrEqual(highCv)
  }
})

describe('storeys from a height', () => {
  it('never fall below one and never shrink with the height', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 200, noNaN: true }),
        fc.double({ min: 2, max: 8, noNaN: true }),
        (heightM, storeyHeightM) => {
          const { storeys, restM } = storeysFromHeight(heightM, storeyHeightM)

          expect(storeys).toBeGreaterThanOrEqual(1)
          expect(storeysFromHeight(heightM + 1, storeyHeightM).storeys).toBeGreaterThanOrEqual(storeys)
          expect(storeys * storeyHeightM + restM).toBeCloseTo(heightM, 9)
        },
      ),
    )
  })

  it('refuses a building without height', () => {
    expect(() => storeysFromHeight(0, 3)).toThrow('parameter-not-positive')
  })
})
