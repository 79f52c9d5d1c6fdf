import { describe, expect, it } from 'vitest'
import { readHeightM, readStoreys, readUse, readYear } from './readRegisterValue'

describe('values of registers', () => {
  it.each([
    [1932, 1932],
    ['1932', 1932],
    [' 1978-05-01 ', 1978],
    ['1978-05-01T00:00:00Z', 1978],
    ['1850.0', 1850],
    [0, undefined],
    [9999, undefined],
    ['19320101', undefined],
    ['before 1919', undefined],
    [1932.5, undefined],
    [true, undefined],
  ])('reads the year of %j as %s', (value, year) => {
    expect(readYear(value)).toBe(year)
  })

  it.each([
    [2, 2],
    ['2,5', 2.5],
    ['0.5', 0.5],
    [0, undefined],
    [-1, undefined],
    [151, undefined],
    ['ground floor', undefined],
    ['1e3', undefined],
  ])('reads the storeys of %j as %s', (value, storeys) => {
    expect(readStoreys(value)).toBe(storeys)
  })

  it.each([
    [6.06, 6.06],
    ['6,06', 6.06],
    ['12 m', 12],
    ['12 metres', 12],
    [0, undefined],
    [-0.1, undefined],
    [901, undefined],
    ['40 ft', undefined],
  ])('reads the height of %j as %s', (value, height) => {
    expect(readHeightM(value)).toBe(height)
  })

  it.each([
    ['terraced', 'terraced'],
    ['woonfunctie', 'multi-family'],
    ['Einfamilienhaus', 'single-family'],
    ['Reihenhaus', 'terraced'],
    ['apartments', 'multi-family'],
    ['garage', 'ancillary'],
    ['kantoorfunctie', 'office'],
    ['industrial', 'industrial'],
    ['École', undefined],
    ['yes', undefined],
    [7, undefined],
  ])('reads the use of %j as %s', (value, use) => {
    expect(readUse(value)).toBe(use)
  })
})
