import { describe, expect, it } from 'vitest'
import { suspectedElements } from './suspectedElements'

const built = (year: number) => ({ constructionYear: { kind: 'exact' as const, year, knownBy: 'seen' as const } })
const named = (elements: ReturnType<typeof suspectedElements>, word: string) =>
  elements.find(({ key }) => key.includes(word))

describe('suspectedElements', () => {
  it('suspects by age, each at its element', () => {
    expect(named(suspectedElements(built(1965)), 'sealants')).toMatchObject({
      component: 'envelope',
      isOfItsTime: true,
    })
    expect(suspectedElements(built(2022))).toEqual([])
  })

  it('suspects everything where the age is not known or only half typed', () => {
    const all = suspectedElements({ constructionYear: { kind: 'unknown' } })

    expect(all.length).toBeGreaterThan(10)
    expect(all.every(({ isOfItsTime }) => !isOfItsTime)).toBe(true)
    expect(suspectedElements({})).toEqual(all)
    expect(suspectedElements(built(19))).toEqual(all)
  })

  it('counts a renewal in the years of use as of its time', () => {
    const done = [{ component: 'envelope' as const, year: built(1970).constructionYear }]

    expect(named(suspectedElements(built(1890)), 'sealants')?.isOfItsTime).toBe(false)
    expect(named(suspectedElements({ ...built(1890), refurbishments: { done } }), 'sealants')?.isOfItsTime).toBe(true)
  })
})
