import { expect, it } from 'vitest'
import { compareFigures } from './compareFigures'

it('takes the wider of the absolute and the relative bound', () => {
  expect(compareFigures(101, 100, { rel: 0.01 })).toEqual([])
  expect(compareFigures(101, 100, { rel: 0.001, abs: 1 })).toEqual([])
  expect(compareFigures(101.01, 100, { rel: 0.01, abs: 1 })).toHaveLength(1)
})

it('names the place of each figure that disagrees', () => {
  const keys = compareFigures({ a: [1, 2], b: { c: 'x' } }, { a: [1, 3], b: { c: 'y' } }, {}).map(({ key }) => key)

  expect(keys).toEqual(['a[1]', 'b.c'])
})

it('misses a figure that was not computed', () => {
  expect(compareFigures({}, { stock: 0 }, { abs: 1 })).toHaveLength(1)
})

it('refuses not-a-number and lists of another length', () => {
  expect(compareFigures(Number.NaN, 1, { abs: 10 })).toHaveLength(1)
  expect(compareFigures([1], [1, 2], { abs: 10 })).toHaveLength(1)
})

it('fails when a documented mistake is reproduced and passes when it is not', () => {
  const expected = { naive_sum: [1, 2], wrong: { shape: 3 } }

  expect(compareFigures({ naive_sum: [1, 2] }, expected, { rel: 1e-6 })).toHaveLength(1)
  expect(compareFigures({ naive_sum: [1, 2.1], wrong: { shape: 4 } }, expected, { rel: 1e-6 })).toEqual([])
  expect(compareFigures({}, expected, { rel: 1e-6 })).toEqual([])
})

it('compares wording freely only where the tolerance says so', () => {
  const expected = { '17 02 01': 'wood or timber' }

  expect(compareFigures({ '17 02 01': 'wood' }, expected, { text: 'meaning must agree' })).toEqual([])
  expect(compareFigures({ '17 02 01': 'glass' }, expected, { text: 'meaning must agree' })).toHaveLength(1)
  expect(compareFigures({ '17 02 01': 'wood' }, expected, {})).toHaveLength(1)
})

it('widens planar figures only where the note of the tolerance says so', () => {
  const tolerance = { rel: 1e-6, note: 'planar formulas only to 1e-3' }

  expect(compareFigures({ planar_m2: 100.05, area_m2: 100.05 }, { planar_m2: 100, area_m2: 100 }, tolerance)).toEqual([
    { key: 'area_m2', got: 100.05, expected: 100 },
  ])
})
