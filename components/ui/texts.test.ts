import { describe, expect, it } from 'vitest'
import { csvText } from './csvText'
import { currentEntry } from './currentEntry'
import { parseTypedNumber } from './parseTypedNumber'
import { sortRows } from './sortRows'

describe('parseTypedNumber', () => {
  it.each([
    ['12', 'en', 12],
    [' 12.5 ', 'en', 12.5],
    ['12,5', 'en', 12.5],
    ['12,5', 'de', 12.5],
    ['12.5', 'de', 12.5],
    ['1,836', 'en', 1836],
    ['1.836', 'de', 1836],
    ['1.836', 'en', 1.836],
    ['1.836,5', 'en', 1836.5],
    ['1,836.5', 'de', 1836.5],
    ['1 836,5', 'fr', 1836.5],
    ['1’836.5', 'de-CH', 1836.5],
    ['1,234,567', 'en', 1_234_567],
    ['.5', 'en', 0.5],
    ['7.', 'en', 7],
    ['−3', 'en', -3],
  ])('reads %s typed in %s as %d', (typed, locale, value) => {
    expect(parseTypedNumber(typed, locale)).toBe(value)
  })

  it('takes an empty field for no answer', () => {
    expect(parseTypedNumber('  ', 'en')).toBeNull()
  })

  it.each(['three', '1.2.3', '12 m', '1,23,4', '-', '.', '--5', '1,2.3,4'])('refuses %s', (typed) => {
    expect(parseTypedNumber(typed, 'en')).toBeNaN()
  })
})

describe('csvText', () => {
  it('quotes what needs it and keeps all digits', () => {
    const text = csvText([
      ['material', 'mass_kg', 'note'],
      ['masonry, units', 1290.123456789, 'said "old"'],
      ['glass', null, 'two\nlines'],
    ])

    expect(text).toBe(
      '\uFEFFmaterial,mass_kg,note\r\n"masonry, units",1290.123456789,"said ""old"""\r\nglass,,"two\nlines"\r\n',
    )
  })

  it('keeps a spreadsheet from running a text, but leaves negative numbers alone', () => {
    expect(csvText([['=HYPERLINK("x")', '-1+1', -5]])).toBe(`\uFEFF"'=HYPERLINK(""x"")",'-1+1,-5\r\n`)
  })

  it('leaves a cell empty where a number is none', () => {
    expect(csvText([[Number.NaN, Number.POSITIVE_INFINITY]])).toBe('\uFEFF,\r\n')
  })
})

describe('sortRows', () => {
  const rows = [{ at: 10 }, { at: null }, { at: 9 }]

  it('puts what is missing last, either way', () => {
    expect(sortRows(rows, ({ at }) => at, 'up').map(({ at }) => at)).toEqual([9, 10, null])
    expect(sortRows(rows, ({ at }) => at, 'down').map(({ at }) => at)).toEqual([10, 9, null])
  })

  it('sorts numbers inside texts by size', () => {
    expect(sortRows(['Tar Lane 12', 'Tar Lane 3'], (name) => name, 'up')).toEqual(['Tar Lane 3', 'Tar Lane 12'])
  })
})

describe('currentEntry', () => {
  const entries = [
    { href: '/', label: 'Start', icon: 'home' },
    { href: '/rounds', label: 'Rounds', icon: 'rounds' },
    { href: '/rounds/outlines', label: 'Outlines', icon: 'outlines' },
  ] as const

  it.each([
    ['/rounds/7', 'Rounds'],
    ['/rounds/outlines/3', 'Outlines'],
    ['/roundsome', 'Start'],
  ])('finds the entry of %s', (path, label) => {
    expect(currentEntry(entries, path)?.label).toBe(label)
  })
})
