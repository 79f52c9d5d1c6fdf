import { describe, expect, it } from 'vitest'
import { guessMapping } from './guessMapping'

const nothing = {
  reference: null,
  street: null,
  houseNumber: null,
  year: null,
  storeys: null,
  heightM: null,
  use: null,
}
const rowsOf = (row: Record<string, (index: number) => string | number>) =>
  Array.from({ length: 20 }, (_, index) =>
    Object.fromEntries(Object.entries(row).map(([name, value]) => [name, value(index)])),
  )

describe('the offered mapping', () => {
  it.each([
    [
      'map tags',
      {
        'building:levels': 'storeys',
        start_date: 'year',
        height: 'heightM',
        'addr:street': 'street',
        'addr:housenumber': 'houseNumber',
        building: 'use',
        osm_id: 'reference',
      },
    ],
    [
      'a German register',
      {
        Baujahr: 'year',
        Geschosse: 'storeys',
        Hoehe: 'heightM',
        Strasse: 'street',
        Hausnummer: 'houseNumber',
        Nutzung: 'use',
        GebaeudeID: 'reference',
      },
    ],
    [
      'a Dutch register',
      {
        oorspronkelijkbouwjaar: 'year',
        aantal_bouwlagen: 'storeys',
        hoogte: 'heightM',
        straatnaam: 'street',
        huisnummer: 'houseNumber',
        gebruiksdoel: 'use',
        identificatie: 'reference',
      },
    ],
    [
      'a table of our own words',
      {
        year: 'year',
        storeys: 'storeys',
        heightM: 'heightM',
        street: 'street',
        houseNumber: 'houseNumber',
        use: 'use',
        reference: 'reference',
      },
    ],
  ])('finds its way in %s', (_title, names) => {
    const values: Record<string, (index: number) => string | number> = {
      year: (index) => 1900 + index,
      storeys: (index) => 1 + (index % 4),
      heightM: (index) => 3.5 + index,
      street: () => 'Ferry Lane',
      houseNumber: (index) => index + 1,
      use: () => 'office',
      reference: (index) => `b-${index}`,
    }
    const row = Object.fromEntries(Object.entries(names).map(([name, ours]) => [name, values[ours] ?? (() => 'x')]))
    const wanted = Object.fromEntries(
      Object.entries(names)

        .map(([name, ours]) => [ours, name]),
    )

    expect(guessMapping(rowsOf(row))).toEqual({ ...nothing, ...wanted })
  })

  it('does not take the date of a row, a lower edge or a roof for what they are not', () => {
    const rows = rowsOf({
      creationdate: () => '2014-07-09',
      'min-height-surface': () => -0.1,
      roofHeight: () => 3,
      updated_year: () => 2020,
      land_use_area: () => 'office',
    })
    expect(guessMapping(rows)).toEqual(nothing)
  })

  it('looks at the values, not only at the name', () => {
    expect(guessMapping(rowsOf({ year: () => 'unknown', id: () => 'the same', height: () => 'tall' }))).toEqual(nothing)
    expect(guessMapping([])).toEqual(nothing)
  })
})
