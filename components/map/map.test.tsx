import { cleanup, render, screen, waitFor } from '@testing-library/react'
import { afterEach, describe, expect, it } from 'vitest'
import { contrastRatio } from '@/components/ui/theme/contrastRatio'
import { accuracyRing } from './accuracyRing'
import { areaFeatures } from './areaFeatures'
import { boundsOf, closedRing } from './boundsOf'
import { outlineFeatures } from './outlineFeatures'
import { OutlineMap } from './OutlineMap'
import type { MapOutline } from './OutlineMap.types'
import { quantileBreaks, RAMP, rampColour } from './ramp'

afterEach(cleanup)

const square: MapOutline = {
  id: 'a',
  geometry: {
    type: 'Polygon',
    coordinates: [
      [
        [4, 52],
        [4.001, 52],
        [4.001, 52.001],
        [4, 52.001],
        [4, 52],
      ],
    ],
  },
}
const paintTimber = () => ({ hatch: 'timber' as const })

describe('boundsOf', () => {
  it('is the box around every position, however deep', () => {
    const moved = {
      type: 'MultiPolygon' as const,
      coordinates: [
        [
          [
            [3.9, 51.9],
            [4, 51.9],
            [4, 52],
            [3.9, 51.9],
          ],
        ],
      ],
    }

    expect(boundsOf([square.geometry, moved])).toEqual([3.9, 51.9, 4.001, 52.001])
  })

  it('is null when there is nothing', () => {
    expect(boundsOf([])).toBeNull()
    expect(boundsOf([{ type: 'GeometryCollection', geometries: [] }])).toBeNull()
  })

  it('closes a ring with its first corner', () => {
    expect(
      closedRing([
        [0, 0],
        [1, 0],
        [1, 1],
      ]),
    ).toEqual([
      [0, 0],
      [1, 0],
      [1, 1],
      [0, 0],
    ])
  })
})

describe('accuracyRing', () => {
  it('is as wide on the ground to the east as to the north', () => {
    const ring = accuracyRing({ longitude: 4, latitude: 60, accuracyM: 111.32 })
    const box = boundsOf([ring])

    expect(box?.[3]).toBeCloseTo(60.001, 6)
    expect(box?.[2]).toBeCloseTo(4.002, 5)
    expect(ring.coordinates[0]?.[0]).toEqual(ring.coordinates[0]?.at(-1))
  })
})

describe('outlineFeatures', () => {
  it('paints an outline with its hatch and the ground of it', () => {
    const { features } = outlineFeatures([square], paintTimber, '#000000')

    expect(features[0]?.properties).toEqual({
      id: 'a',
      fill: '#E5C283',
      hatch: 'timber',
      outline: '#000000',
      opacity: 1,
      outlinePx: 1,
    })
  })
})

describe('areaFeatures', () => {
  it('sets the name of an area once, inside it', () => {
    const { features } = areaFeatures([{ id: 'b', geometry: square.geometry, name: 'Beat 4' }], '#1B5566')

    expect(features[0]?.properties).toEqual({ colour: '#1B5566' })
    expect(features[1]?.properties).toEqual({ name: 'Beat 4' })
    expect(boundsOf([features[1]!.geometry])?.[0]).toBeCloseTo(4.0005, 6)
  })

  it('still sets the name where the ring encloses nothing', () => {
    const flat = {
      type: 'Polygon' as const,
      coordinates: [
        [
          [4, 52],
          [4.002, 52],
          [4, 52],
        ],
      ],
    }

    expect(areaFeatures([{ id: 'b', geometry: flat, name: 'Beat 5' }], '#1B5566').features).toHaveLength(2)
  })
})

describe('ramp', () => {
  it('darkens step by step, so that it reads in grey', () => {
    const contrasts = RAMP.map((colour) => contrastRatio(colour, '#FFFFFF'))

    expect([...contrasts].sort((one, other) => one - other)).toEqual(contrasts)
  })

  it('puts as many things in each step', () => {
    const values = Array.from({ length: 100 }, (_, place) => place)
    const breaks = quantileBreaks(values)

    expect(breaks).toEqual([20, 40, 60, 80])
    expect(rampColour(0, breaks)).toBe(RAMP[0])
    expect(rampColour(99, breaks)).toBe(RAMP[4])
  })

  it('makes no step of nothing when values are equal or missing', () => {
    expect(quantileBreaks([7, 7, 7, Number.NaN])).toEqual([])
    expect(quantileBreaks([])).toEqual([])
    expect(rampColour(7, [])).toBe(RAMP[0])
  })
})

describe('OutlineMap', () => {
  it('says that nothing is lost where the browser cannot draw it', async () => {
    render(<OutlineMap label="Beat 4" outlines={[square]} paint={paintTimber} heightPx={300} />)

    await waitFor(() => expect(screen.getByText(/Nothing is lost: the list holds the same buildings/)).toBeTruthy(), {
      timeout: 10_000,
    })
  })
})
