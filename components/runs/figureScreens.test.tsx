import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import type { ReactNode } from 'react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { FactorBookScreen } from '@/components/factors/FactorBookScreen'
import { YearsAheadScreen } from '@/components/flows/YearsAheadScreen'
import { LoadsAheadScreen } from '@/components/loads/LoadsAheadScreen'
import { PublicationLoadsScreen } from '@/components/loads/PublicationLoadsScreen'
import { PublishScreen } from '@/components/publish/PublishScreen'
import { StockScreen } from '@/components/stock/StockScreen'
import { MessagesProvider } from '@/components/ui/MessagesProvider'
import { ThemeProvider } from '@/components/ui/theme/ThemeProvider'
import { ToastProvider } from '@/components/ui/Toast'
import type { LoadsAhead, Publication } from '@/shared/api/publications'
import { FIRST_YARD_PLAN } from '@/shared/schemas/yardPlan'
import { createMessages } from '@/shared/messages/createMessages'
import type { FullEdition } from '@/shared/schemas/factorBook'
import { exampleResult, exampleRun } from './runExample'

vi.mock('expo-router', () => ({
  useLocalSearchParams: () => ({}),
  useRouter: () => ({ setParams: vi.fn() }),
}))
const call = vi.fn()
vi.mock('@/sync/react/SessionProvider', () => ({ useApi: () => ({ call }) }))

const publication: Publication = {
  publicationId: '0191c0de-0000-7000-8000-000000000011',
  runId: exampleRun.runId,
  runNumber: 7,
  title: 'Ropewalk ahead',
  districtName: 'Ropewalk',
  roundName: 'Autumn round',
  editionNumber: 1,
  surveyYear: 2026,
  publishedByName: 'M. Quill',
  publishedAt: '2026-11-30T12:00:00.000Z',
  withdrawnAt: null,
  withdrawalReason: null,
  recipients: [{ personId: '0191c0de-0000-7000-8000-000000000012', name: 'T. Sledge', firm: 'Sledge & Daughters' }],
}
const withdrawn: Publication = {
  ...publication,
  publicationId: '0191c0de-0000-7000-8000-000000000013',
  title: 'Old figures',
  withdrawnAt: '2026-11-30T13:00:00.000Z',
  withdrawalReason: 'A street was counted twice.',
}
const loads: LoadsAhead = {
  publication,
  fleet: { containerM3: 30, payloadT: 13 },
  years: [2027, 2028],
  lines: [2027, 2028].map((year) => ({
    year,
    code: '17 02 01',
    text: 'wood',
    isHazardous: false,
    mirrorHazardousCode: '17 02 04*',
    materials: ['timber'],
    massKg: { low: 1_000, likely: 2_000, high: 4_000 },
    looseVolumeM3: { low: 5, likely: 10, high: 20 },
    loads: { low: 1, likely: 1, high: 2 },
  })),
  unassigned: [{ material: 'other', massKg: 70 }],
  densities: [
    { code: '17 02 01', lowKgPerM3: 150, highKgPerM3: 300, source: 'a weighbridge', provenance: 'from-memory' },
  ],
  basis: {
    computedCount: 80,
    frameCount: 100,
    impliedDemolitionRatePerYear: 0.004,
    engineVersion: '1.0.0',
    yearOffset: 0.5,
  },
}
const edition: FullEdition = {
  editionId: exampleRun.editionId,
  number: 1,
  name: 'first',
  state: 'issued',
  issuedAt: '2026-10-01T00:00:00.000Z',
  issuedByName: 'M. Quill',
  rows: { intensities: [], lifetimes: [], densities: [], wasteCodes: [], suspicions: [] },
}
const replies: Readonly<Record<string, unknown>> = {
  '/runs': { runs: [exampleRun] },
  '/runs/:runId': { ...exampleRun, result: exampleResult },
  '/publications': { publications: [publication, withdrawn] },
  '/yard/publications': { publications: [publication, withdrawn] },
  '/yard/publications/:publicationId/loads': loads,
  '/yard/plan': FIRST_YARD_PLAN,
  '/factor-book/editions': { editions: [edition] },
  '/factor-book/editions/:editionId': edition,
  '/people': { people: [] },
}

afterEach(cleanup)

function show(children: ReactNode): void {
  call.mockImplementation(({ path, method }: { path: string; method: string }, input: { body?: unknown }) =>
    Promise.resolve(method === 'PUT' ? input.body : replies[path]),
  )
  render(
    <ThemeProvider>
      <MessagesProvider messages={createMessages('en')}>
        <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
          <ToastProvider>{children}</ToastProvider>
        </QueryClientProvider>
      </MessagesProvider>
    </ThemeProvider>,
  )
}

describe('screens of figures', () => {
  it('shows the stock by material, use, structure and period', async () => {
    show(<StockScreen />)

    const table = await screen.findByRole('table', { name: 'By material' })
    expect(within(table).getByText('from memory')).toBeTruthy()
    for (const name of ['By use', 'By structure', 'By period']) {
      expect(screen.getByRole('table', { name: new RegExp(name) })).toBeTruthy()
    }
  })

  it('shows the years ahead with a table beside the chart', async () => {
    show(<YearsAheadScreen />)

    const table = await screen.findByRole('table', { name: 'By year and material' })
    expect(within(table).getByText('2028')).toBeTruthy()
    expect(screen.getByText(/not split by component/)).toBeTruthy()
  })

  it('keeps my vehicles and plant, counts the loads anew, and says which years exceed the plant', async () => {
    show(<PublicationLoadsScreen publicationId={publication.publicationId} onBack={vi.fn()} />)
    expect(await screen.findByRole('table', { name: 'Totals by waste code, 2027–2028' })).toBeTruthy()
    expect(screen.getByText(/Say above what your plant takes in/)).toBeTruthy()

    fireEvent.change(screen.getByRole('textbox', { name: /Container/ }), { target: { value: '12' } })
    fireEvent.change(screen.getByRole('textbox', { name: /My plant takes in/ }), { target: { value: '3' } })
    fireEvent.click(screen.getByRole('button', { name: 'Keep and count anew' }))

    await vi.waitFor(() =>
      expect(call).toHaveBeenCalledWith(
        expect.objectContaining({ path: '/yard/publications/:publicationId/loads' }),
        expect.objectContaining({ query: { containerM3: 12, payloadT: 13 } }),
        expect.anything(),
      ),
    )
    expect(await screen.findByText('0 of 2 years exceed the plant; 2 more may.')).toBeTruthy()
  })

  it('holds what is recovered against the target of the directive', async () => {
    show(<PublicationLoadsScreen publicationId={publication.publicationId} onBack={vi.fn()} />)
    expect(await screen.findByText(/the target of 70 % by weight .* is not met/)).toBeTruthy()

    fireEvent.change(screen.getByRole('textbox', { name: /17 02 01 wood/ }), { target: { value: '80' } })

    expect(await screen.findByText(/80 % of 4 t of non-hazardous waste .* is met/)).toBeTruthy()
  })

  it('shows why a publication was withdrawn instead of its figures', async () => {
    show(<PublicationLoadsScreen publicationId={withdrawn.publicationId} onBack={vi.fn()} />)

    expect(await screen.findByText(/A street was counted twice/)).toBeTruthy()
    expect(screen.queryByRole('table')).toBeNull()
  })

  it('opens a publication from the list of the yard', async () => {
    const open = vi.fn()
    show(<LoadsAheadScreen onOpen={open} />)

    fireEvent.click(await screen.findByRole('button', { name: 'Open “Ropewalk ahead”' }))

    expect(open.mock.calls).toEqual([[publication.publicationId]])
  })

  it('asks for a reason before it withdraws', async () => {
    show(<PublishScreen />)
    fireEvent.click(await screen.findByRole('button', { name: 'Withdraw “Ropewalk ahead”' }))

    fireEvent.click(await screen.findByRole('button', { name: 'Withdraw' }))

    expect(await screen.findByText('Say why, in a sentence.')).toBeTruthy()
  })

  it('says that an edition has no row that fits', async () => {
    show(<FactorBookScreen editionId={null} onChoose={vi.fn()} />)

    expect(await screen.findByText('No row fits')).toBeTruthy()
  })
})
