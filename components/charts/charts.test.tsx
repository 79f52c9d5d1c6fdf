import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { AgePyramid } from './AgePyramid'
import { BandChart } from './BandChart'
import { BeatWall } from './BeatWall'
import { Course } from './Course'
import { Legend } from './Legend'
import { StackedFlows } from './StackedFlows'
import { SurvivalCurve } from './SurvivalCurve'
import { Swatch } from './Swatch'

afterEach(cleanup)

/** Unbroken spaces read as plain ones. */
const nameOf = (element: HTMLElement): string => (element.getAttribute('aria-label') ?? '').replace(/\u00a0/g, ' ')

const flows = [2027, 2028, 2029].map((year, place) => ({
  year,
  parts: [
    { material: 'concrete' as const, massKg: 1_000_000 * (place + 1) },
    { material: 'timber' as const, massKg: 200_000 },
  ],
  lowKg: 900_000 * (place + 1),
  highKg: 1_500_000 * (place + 1),
}))

describe('Course', () => {
  it('says its composition in words and shares', () => {
    render(
      <Course
        of="Block 17"
        parts={[
          { material: 'concrete', massKg: 750 },
          { material: 'timber', massKg: 250 },
        ]}
      />,
    )

    expect(nameOf(screen.getByRole('img'))).toBe('Block 17. Composition by mass: concrete 75 %, timber 25 %')
  })

  it('draws each material with its hatch', () => {
    const { container } = render(
      <Course
        parts={[
          { material: 'steel', massKg: 1 },
          { material: 'glass', massKg: 1 },
        ]}
      />,
    )

    expect(container.querySelectorAll('pattern')).toHaveLength(2)
    expect(container.querySelectorAll('rect[fill^="url(#hatch-"]')).toHaveLength(2)
  })

  it('says that there is nothing to draw', () => {
    render(<Course parts={[]} />)

    expect(nameOf(screen.getByRole('img'))).toBe('Nothing to draw yet')
  })
})

describe('BeatWall', () => {
  it('lays a brick a building and says how many of each', () => {
    const { container } = render(<BeatWall handedIn={3} inTheBag={2} sentBack={1} toDo={4} showLegend={false} />)

    expect(container.querySelectorAll('svg > g')).toHaveLength(10)
    expect(nameOf(screen.getByRole('img'))).toBe('3 handed in, 2 in the bag, 1 sent back, 4 to do, of 10 buildings')
  })

  it('lists only the states that occur', () => {
    render(<BeatWall handedIn={3} inTheBag={0} sentBack={0} toDo={4} />)

    expect(screen.getAllByRole('listitem').map((entry) => entry.textContent)).toEqual(['handed in3', 'to do4'])
  })
})

describe('StackedFlows', () => {
  it('says its years and its peak', () => {
    render(<StackedFlows title="Years ahead" flows={flows} />)

    expect(nameOf(screen.getByRole('img'))).toBe('Years ahead: 2027–2029, highest in 2029 with 3,200 t')
  })

  it('tells which year was pressed', () => {
    const pressed = vi.fn()
    render(<StackedFlows title="Years ahead" flows={flows} onPressYear={pressed} />)

    fireEvent.click(screen.getByRole('img'), { clientX: 200 })

    expect(pressed).toHaveBeenCalledWith(2028)
  })

  it('draws nothing but its name when there are no flows', () => {
    render(<StackedFlows title="Years ahead" flows={[]} />)

    expect(nameOf(screen.getByRole('img'))).toBe('Years ahead. Nothing to draw yet')
  })
})

describe('other charts', () => {
  it('draws a line and a band for each series', () => {
    const points = [2027, 2028].map((year) => ({ year, likelyKg: 5e6, lowKg: 4e6, highKg: 7e6 }))
    const { container } = render(
      <BandChart title="Timber" series={[{ key: 'a', label: 'a', points }]} markedYear={2027} />,
    )

    expect(nameOf(screen.getByRole('img'))).toBe('Timber: 2027–2028, from 5,000 t to 5,000 t')
    expect(container.querySelectorAll('path')).toHaveLength(2)
  })

  it('says at which age half of a cohort is gone', () => {
    const points = [0, 50, 100].map((ageYears) => ({ ageYears, share: 1 - ageYears / 100 }))
    render(<SurvivalCurve title="Masonry" series={[{ key: 'fit', label: 'fit', points }]} />)

    expect(nameOf(screen.getByRole('img'))).toBe('Masonry: half are gone after 50 years')
  })

  it('says which period is the largest', () => {
    const rows = [
      { key: 'a', label: 'before 1919', left: 3, right: 10 },
      { key: 'b', label: '1919–1945', left: 9, right: 40 },
    ]
    render(
      <AgePyramid
        title="By age"
        rows={rows}
        leftHead="buildings"
        rightHead="t"
        formatLeft={String}
        formatRight={String}
      />,
    )

    expect(nameOf(screen.getByRole('img'))).toBe('By age: largest period 1919–1945 with 40')
  })

  it('keeps swatches from screen readers and names the entries of a legend', () => {
    render(<Legend entries={[{ key: 'c', label: 'copper', mark: <Swatch material="copper" />, value: '2 %' }]} />)

    expect(screen.getByRole('list', { name: 'Legend' })).toBeTruthy()
    expect(screen.queryByRole('img')).toBeNull()
  })
})
