import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { MessagesProvider } from '@/components/ui/MessagesProvider'
import { ThemeProvider } from '@/components/ui/theme/ThemeProvider'
import type { NextLooksReply } from '@/shared/api/nextLook'
import { createMessages } from '@/shared/messages/createMessages'
import type { RankedLook } from '@/shared/schemas/nextLook'
import { LookNextScreen } from './LookNextScreen'
import { visitsByBeat, visitsByStratum } from './planVisits'

vi.mock('expo-router', () => ({
  useLocalSearchParams: () => ({}),
  useRouter: () => ({ setParams: vi.fn() }),
}))
vi.mock('@/components/map/OutlineMap', () => ({ OutlineMap: () => null }))
const call = vi.fn()
vi.mock('@/sync/react/SessionProvider', () => ({ useApi: () => ({ call }) }))
afterEach(cleanup)

const idOf = (number: number) => `0191c0de-0000-7000-8000-${String(number).padStart(12, '0')}`
const ROUND = idOf(900)
const look = (number: number, change: Partial<RankedLook> = {}): RankedLook => ({
  buildingId: idOf(number),
  outlineId: idOf(100 + number),
  beatId: idOf(500),
  label: `Tar Lane ${number}`,
  state: 'to-do',
  use: 'terraced',
  floorAreaM2: 400,
  meanKg: 50_000,
  fallKg2: 1e9 / number,
  fallShare: 0.1 / number,
  settleShare: 0.4 / number,
  byAttributeKg2: { floorArea: 1e8, constructionYear: 5e8, structure: 1e8, use: 0 },
  reason: { narrows: 'constructionYear', isLarge: number === 1 },
  ...change,
})
const looks = [
  look(1),
  look(2, { use: 'office', beatId: null }),
  look(3, { state: 'checked', reason: { narrows: 'structure', isLarge: false } }),
  look(4),
  look(5, { use: 'office' }),
]
const ranked: NextLooksReply = {
  figure: { material: 'all', byYear: null },
  chosenFigure: { material: 'all', byYear: null },
  surveyYear: 2026,
  run: { runId: idOf(901), number: 7, editionNumber: 2, isOfRound: true },
  frameCount: 40,
  recordedCount: 12,
  meanKg: 200_000,
  varianceKg2: 1e10,
  varianceShares: { measurement: 0.6, factor: 0.4, lifetime: 0, chance: 0 },
  beats: [{ beatId: idOf(500), name: 'Beat 4' }],
  looks,
}
const round = { roundId: ROUND, name: 'Autumn round', districtName: 'Ropewalk', districtId: idOf(902) }

function show(reply: NextLooksReply = ranked): void {
  call.mockImplementation(({ path, method }: { path: string; method: string }, input: { body?: unknown }) => {
    if (method === 'PUT') return Promise.resolve(input.body)
    if (path === '/rounds') return Promise.resolve({ rounds: [round] })
    return Promise.resolve(path.endsWith('/next-look') ? reply : { type: 'FeatureCollection', features: [] })
  })
  render(
    <ThemeProvider>
      <MessagesProvider messages={createMessages('en')}>
        <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
          <LookNextScreen />
        </QueryClientProvider>
      </MessagesProvider>
    </ThemeProvider>,
  )
}

describe('the desk screen of where to look next', () => {
  it('lists the buildings with their reasons in words', async () => {
    show()

    const list = await screen.findByRole('table', { name: 'The list' })
    expect(within(list).getByText('large, age not known')).toBeTruthy()
    expect(within(list).getByText('recorded, but structure not known')).toBeTruthy()
    expect(within(list).getAllByText('Beat 4').length).toBe(4)
  })

  it('says how much narrower the band becomes, and shares the visits out by beat or stratum', async () => {
    show()
    const beats = await screen.findByRole('table', { name: 'By beat' })
    expect(within(beats).getByText('no beat')).toBeTruthy()
    expect(screen.getByText(/After 5 visits: .* narrower/)).toBeTruthy()

    fireEvent.click(screen.getByRole('radio', { name: 'strata of use' }))

    expect(within(screen.getByRole('table', { name: 'By use' })).getByText('office')).toBeTruthy()
  })

  it('asks for another figure, and tells the phones only when it is wished', async () => {
    show()
    expect(await screen.findByText(/The phones of this round work for: all materials standing today/)).toBeTruthy()
    expect(screen.queryByRole('button', { name: 'Show this on the phones' })).toBeNull()

    fireEvent.click(screen.getByRole('radio', { name: 'coming down by a year' }))
    await vi.waitFor(() =>
      expect(call).toHaveBeenCalledWith(
        expect.objectContaining({ path: '/rounds/:roundId/next-look' }),
        expect.objectContaining({ query: { material: 'all', byYear: 2040 } }),
        expect.anything(),
      ),
    )
    fireEvent.click(await screen.findByRole('button', { name: 'Show this on the phones' }))

    await vi.waitFor(() =>
      expect(call).toHaveBeenCalledWith(expect.objectContaining({ path: '/rounds/:roundId/look-figure' }), {
        params: { roundId: ROUND },
        body: { material: 'all', byYear: 2040 },
      }),
    )
  })

  it('says that nothing more can be settled where the list is empty', async () => {
    show({ ...ranked, looks: [] })
    expect(await screen.findByText('Nothing more to settle')).toBeTruthy()
  })
})

describe('the plan of visits', () => {
  it('counts the first of the list by beat', () => {
    expect(visitsByBeat(looks, 2).map(({ beatId, visitCount }) => [beatId === null, visitCount])).toEqual([
      [false, 1],
      [true, 1],
    ])
  })

  it('shares them over the strata of what is not recorded, never more than there are', () => {
    const plan = visitsByStratum(looks, 3)

    expect(plan.map(({ stratum, frameCount }) => [stratum, frameCount])).toEqual(
      expect.arrayContaining([
        ['terraced', 2],
        ['office', 2],
      ]),
    )
    expect(plan.every(({ visitCount, frameCount }) => visitCount <= frameCount)).toBe(true)
    expect(visitsByStratum([], 3)).toEqual([])
    expect(visitsByStratum(looks, 0).every(({ visitCount }) => visitCount === 0)).toBe(true)
  })
})
