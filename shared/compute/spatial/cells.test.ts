import fc from 'fast-check'
import { expect, it } from 'vitest'
import { sharedCells } from './sharedCells'
import { worldCell } from './worldCell'

it('withholds thin cells and loses nothing', () => {
  const cell = fc.record({
    cellId: fc.string(),
    buildings: fc.integer({ min: 1, max: 9 }),
    amount: fc.integer({ min: 0, max: 1000 }),
  })
  fc.assert(
    fc.property(fc.array(cell), (cells) => {
      const { shown, withheld } = sharedCells(cells)
      const total = (list: readonly { amount: number }[]) => list.reduce((sum, { amount }) => sum + amount, 0)

      expect(shown.every(({ buildings }) => buildings >= 3)).toBe(true)
      expect(total(shown) + withheld.amount).toBe(total(cells))
      expect(shown.length + withheld.cells).toBe(cells.length)
    }),
  )
  expect(() => sharedCells([], 0)).toThrow('parameter-out-of-range')
})

it('names the same cell for positions a metre apart and another one a kilometre on', () => {
  const { id, areaM2 } = worldCell([13.405, 52.52], 9)

  expect(worldCell([13.405015, 52.52], 9).id).toBe(id)
  expect(worldCell([13.42, 52.52], 9).id).not.toBe(id)
  expect(areaM2).toBeGreaterThan(60_000)
  expect(areaM2).toBeLessThan(150_000)
})

it('refuses a level the grid has not and a place off the Earth', () => {
  expect(() => worldCell([0, 0], 16)).toThrow('parameter-out-of-range')
  expect(() => worldCell([0, 0], 1.5)).toThrow('parameter-out-of-range')
  expect(() => worldCell([0, 91], 5)).toThrow('coordinates-out-of-range')
})
