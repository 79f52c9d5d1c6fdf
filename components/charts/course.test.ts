import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bondJoints } from './bondJoints'
import { courseStretches } from './courseStretches'
import { wallLayout } from './wallLayout'

describe('courseStretches', () => {
  it('gives each material its width by mass', () => {
    expect(courseStretches([3, 1], 100, 4)).toEqual([
      { part: 0, fromPx: 0, toPx: 75 },
      { part: 1, fromPx: 75, toPx: 100 },
    ])
  })

  it('keeps a trace of a material in sight at the cost of the wide ones', () => {
    const widths = courseStretches([999, 1, 1000], 200, 5).map(({ fromPx, toPx }) => toPx - fromPx)

    expect(widths[1]).toBe(5)
    expect(widths[0]).toBeLessThan(widths[2] ?? 0)
  })

  it('takes no room for what is not there', () => {
    expect(courseStretches([0, Number.NaN, -4], 100, 4)).toEqual([])
    expect(courseStretches([0, 5], 100, 4)).toEqual([{ part: 1, fromPx: 0, toPx: 100 }])
  })

  it('fills the bar without gaps, whatever the masses', () => {
    const masses = fc.array(fc.double({ min: 0.001, max: 1e9, noNaN: true }), { minLength: 1, maxLength: 18 })
    fc.assert(
      fc.property(masses, fc.integer({ min: 60, max: 1400 }), (massesKg, widthPx) => {
        const stretches = courseStretches(massesKg, widthPx, 6)
        expect(stretches).toHaveLength(massesKg.length)
        expect(stretches.at(-1)?.toPx).toBe(widthPx)
        for (const [place, { fromPx, toPx }] of stretches.entries()) {
          expect(fromPx).toBe(place === 0 ? 0 : stretches[place - 1]?.toPx)
          expect(toPx - fromPx).toBeGreaterThan(Math.min(6, widthPx / massesKg.length) - 1e-6)
        }
      }),
    )
  })
})

describe('bondJoints', () => {
  it('sets every other row off by half a stone', () => {
    const stretch = [{ part: 0, fromPx: 0, toPx: 100 }]

    expect(bondJoints(stretch, 0, 40)).toEqual([40, 80])
    expect(bondJoints(stretch, 1, 40)).toEqual([20, 60])
  })

  it('leaves no sliver at the end of a stretch', () => {
    expect(bondJoints([{ part: 0, fromPx: 0, toPx: 84 }], 0, 40)).toEqual([40])
  })
})

describe('wallLayout', () => {
  it('lays a brick a building inside the width, from the foot', () => {
    const { bricks, brickWidthPx, heightPx } = wallLayout(118, 340, 150)

    expect(bricks).toHaveLength(118)
    expect(Math.max(...bricks.map(({ x }) => x + brickWidthPx))).toBeLessThanOrEqual(340)
    expect(heightPx).toBeLessThanOrEqual(150)
    expect(bricks[0]?.y).toBeGreaterThan(bricks[117]?.y ?? 0)
  })

  it('takes smaller bricks for a longer beat', () => {
    expect(wallLayout(900, 340, 150).brickWidthPx).toBeLessThan(wallLayout(40, 340, 150).brickWidthPx)
  })
})
