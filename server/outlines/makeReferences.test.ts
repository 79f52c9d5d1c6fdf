import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { makeReferences } from './makeReferences'

describe('references', () => {
  it('are kept where the file has them and made up, in order, where it has none', () => {
    expect(makeReferences([null, 'A', null], new Set())).toEqual(['R-0001', 'A', 'R-0002'])
  })

  it('go on after the highest number that is there or comes', () => {
    expect(makeReferences([null, 'R-0040'], new Set(['R-0007', 'x']))).toEqual(['R-0041', 'R-0040'])
    expect(makeReferences([null], new Set(['R-9999']))).toEqual(['R-10000'])
  })

  it('get their count when they come again', () => {
    expect(makeReferences(['A', 'A', 'A', 'A (2)'], new Set())).toEqual(['A', 'A (2)', 'A (3)', 'A (2) (2)'])
  })

  it('are never twice the same, whatever was given and taken', () => {
    const word = fc.constantFrom('A', 'A (2)', 'R-0001', 'R-0002', 'B')
    fc.assert(
      fc.property(fc.array(fc.option(word)), fc.uniqueArray(word), (given, taken) => {
        const made = makeReferences(given, new Set(taken))
        expect(new Set([...made, ...taken]).size).toBe(made.length + taken.length)
      }),
    )
  })
})
