import { readFileSync } from 'node:fs'
import path from 'node:path'
import fc from 'fast-check'
import { expect, it } from 'vitest'
import { ComputeError } from '@/shared/compute/errors'
import { normaliseOutline } from './normaliseOutline'
import { normaliseRing } from './normaliseRing'
import { ringOrientation } from './ringOrientation'

interface OutlineFile {
  features: { geometry: { type: string; coordinates: number[][][] } }[]
}

const square = [
  [4.36, 52.01],
  [4.37, 52.01],
  [4.37, 52.02],
  [4.36, 52.02],
  [4.36, 52.01],
]

function codeOf(action: () => unknown): string {
  try {
    action()
  } catch (fault) {
    if (fault instanceof ComputeError) return fault.code
  }
  return 'accepted'
}

it('leaves a conforming ring as it is', () => {
  expect(normaliseRing(square)).toEqual({ ring: square, changes: [] })
})

it('turns clockwise exteriors and counter-clockwise holes round', () => {
  const clockwise = [...square].reverse()

  expect(normaliseRing(clockwise).changes).toEqual(['reversed'])
  expect(ringOrientation(normaliseRing(clockwise).ring)).toBe('counter-clockwise')
  expect(ringOrientation(normaliseRing(square, { role: 'hole' }).ring)).toBe('clockwise')
})

it('closes, rounds to seven decimals, and drops heights and repeats', () => {
  const given = [
    [4.36, 52.01, 3.5],
    [4.37, 52.01, 3.5],
    [4.37, 52.01, 3.5],
    [4.37000000004, 52.02, 3.5],
    [4.36, 52.02, 3.5],
  ]

  const { ring, changes } = normaliseRing(given)

  expect(ring).toEqual(square)
  expect(changes).toEqual(['closed', 'rounded', 'repeats-removed'])
})

it.each([
  [
    'ring-too-short',
    [
      [0, 0],
      [1, 1],
      [0, 0],
    ],
  ],
  ['ring-too-short', []],
  [
    'ring-crosses-itself',
    [
      [0, 0],
      [2, 2],
      [2, 0],
      [0, 2],
      [0, 0],
    ],
  ],
  [
    'ring-crosses-itself',
    [
      [0, 0],
      [4, 0],
      [2, 0],
      [2, 2],
      [0, 2],
      [0, 0],
    ],
  ],
  [
    'ring-crosses-itself',
    [
      [0, 0],
      [1, 0],
      [2, 0],
      [0, 0],
    ],
  ],
  [
    'not-a-number',
    [
      [0, 0],
      [1, Number.NaN],
      [2, 0],
      [0, 0],
    ],
  ],
  ['not-a-number', [[0], [1, 1], [2, 0], [0, 0]]],
  [
    'coordinates-projected',
    [
      [84500, 447100],
      [84510, 447100],
      [84510, 447110],
      [84500, 447100],
    ],
  ],
  [
    'coordinates-swapped',
    [
      [-33.8, 151.2],
      [-33.8, 151.3],
      [-33.9, 151.3],
      [-33.8, 151.2],
    ],
  ],
  [
    'coordinates-out-of-range',
    [
      [200, 100],
      [201, 100],
      [201, 101],
      [200, 100],
    ],
  ],
])('refuses %s: %j', (code, positions) => {
  expect(codeOf(() => normaliseRing(positions))).toBe(code)
})

it('recognises swapped coordinates of a district it knows, though both orders lie on Earth', () => {
  const swapped = square.map(([longitude = 0, latitude = 0]) => [latitude, longitude])

  expect(codeOf(() => normaliseRing(swapped))).toBe('accepted')
  expect(codeOf(() => normaliseRing(swapped, { near: [4.36, 52.01] }))).toBe('coordinates-swapped')
})

it('says where a ring crosses itself, in degrees', () => {
  const bow = [
    [1, 1],
    [3, 3],
    [3, 1],
    [1, 3],
    [1, 1],
  ]

  expect(() => normaliseRing(bow)).toThrow('{"at":[1,1]}')
})

it('accepts all real outlines of a neighbourhood', () => {
  const file = path.join(import.meta.dirname, '..', '..', '..', 'tests', 'fixtures', 'outlines-real.geojson')
  const { features } = JSON.parse(readFileSync(file, 'utf8')) as OutlineFile
  const codes = features.map(({ geometry }) => {
    const polygons =
      geometry.type === 'MultiPolygon' ? (geometry.coordinates as unknown as number[][][][]) : [geometry.coordinates]
    return polygons.map((rings) => codeOf(() => normaliseOutline(rings, [4.36, 52.01])))
  })

  expect(codes.flat().filter((code) => code !== 'accepted')).toEqual([])
  expect(features).toHaveLength(160)
})

it('gives the same ring when run again', () => {
  const triangle = fc.array(
    fc.tuple(fc.double({ min: -170, max: 170, noNaN: true }), fc.double({ min: -80, max: 80, noNaN: true })),
    {
      minLength: 3,
      maxLength: 3,
    },
  )
  fc.assert(
    fc.property(triangle, (corners) => {
      fc.pre(codeOf(() => normaliseRing(corners)) === 'accepted')
      const { ring } = normaliseRing(corners)

      expect(normaliseRing(ring)).toEqual({ ring, changes: [] })
    }),
  )
})
