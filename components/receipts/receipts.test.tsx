import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { MessagesProvider } from '@/components/ui/MessagesProvider'
import { ThemeProvider } from '@/components/ui/theme/ThemeProvider'
import { createMessages } from '@/shared/messages/createMessages'
import { figureOfAddress } from './figureOfAddress'
import { exampleReceipt } from './receiptExample'
import { receiptHref } from './receiptHref'
import { ReceiptScreen } from './ReceiptScreen'
import { termTotals } from './termTotals'

const push = vi.fn()
vi.mock('expo-router', () => ({ useRouter: () => ({ push }) }))
const call = vi.fn()
vi.mock('@/sync/react/SessionProvider', () => ({ useApi: () => ({ call }) }))
afterEach(cleanup)

const runId = exampleReceipt.run.runId

function show(address: Readonly<Record<string, string>>): void {
  call.mockResolvedValue(exampleReceipt)
  render(
    <ThemeProvider>
      <MessagesProvider messages={createMessages('en')}>
        <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
          <ReceiptScreen address={address} />
        </QueryClientProvider>
      </MessagesProvider>
    </ThemeProvider>,
  )
}

describe('the page behind a figure', () => {
  it('shows the figure, its groups with their sum, the lines and the sources', async () => {
    show({ run: runId, kind: 'demolition', from: '2027', to: '2027' })

    const groups = await screen.findByRole('table', { name: 'By group' })
    expect(within(groups).getByText('terraced house')).toBeTruthy()
    expect(screen.getByText('all materials coming down, 2027')).toBeTruthy()
    expect(screen.getByText('= 12 t')).toBeTruthy()
    expect(screen.getByText(/gypsum.*not available, which is not zero/)).toBeTruthy()
    const lives = screen.getByRole('table', { name: 'Lives' })
    expect(within(lives).getAllByText('set by the scenario').length).toBe(2)
    expect(
      within(screen.getByRole('table', { name: 'Rows of the factor book' })).getByText('a published table'),
    ).toBeTruthy()
  })

  it('opens a group at an address of its own', async () => {
    show({ run: runId, kind: 'demolition', from: '2027', to: '2027' })

    fireEvent.click(await screen.findByRole('button', { name: /^Open office/ }))

    expect(push).toHaveBeenCalledWith(
      receiptHref({
        runId,
        kind: 'demolition',
        material: 'all',
        fromYear: 2027,
        toYear: 2027,
        use: 'office',
        structure: 'reinforced-concrete',
        period: '1961-1975',
      }),
    )
  })

  it('says what an address lacks', () => {
    show({ kind: 'stock' })
    expect(screen.getByText('This address names no run')).toBeTruthy()
  })
})

describe('the address of a receipt', () => {
  it('is read back as it was written', () => {
    const wanted = {
      runId,
      kind: 'refurbishment',
      material: 'timber',
      fromYear: 2027,
      toYear: 2036,
      use: 'office',
      structure: null,
      period: null,
      buildingId: null,
    } as const
    const query = Object.fromEntries(new URLSearchParams(receiptHref(wanted).split('?')[1]))

    const { runId: _run, ...figure } = wanted
    expect(figureOfAddress(query)).toEqual({ runId, figure })
  })

  it('names no figure with words that are none of ours', () => {
    expect(figureOfAddress({ run: runId, kind: 'nonsense' })).toBeNull()
    expect(figureOfAddress({ run: runId, from: 'soon' })).toBeNull()
  })
})

it('adds the lines of the groups up by material, with their weighted content', () => {
  const [concrete, timber] = termTotals(exampleReceipt.groups)

  expect(concrete).toMatchObject({ massKg: 10_000, countedAreaM2: 12, rowCount: 1 })
  expect(concrete!.contentKgPerM2).toBeCloseTo(10_000 / 12, 9)
  expect(timber!.massKg).toBe(2_000)
})
