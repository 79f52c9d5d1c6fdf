import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { MessagesProvider } from '@/components/ui/MessagesProvider'
import { ThemeProvider } from '@/components/ui/theme/ThemeProvider'
import { ToastProvider } from '@/components/ui/Toast'
import { createMessages } from '@/shared/messages/createMessages'
import type { FullEdition } from '@/shared/schemas/factorBook'
import { FactorBookScreen } from './FactorBookScreen'

const call = vi.fn()
vi.mock('@/sync/react/SessionProvider', () => ({ useApi: () => ({ call }) }))

const draft: FullEdition = {
  editionId: '0191c0de-0000-7000-8000-000000000001',
  number: 2,
  name: 'Autumn',
  state: 'draft',
  issuedAt: null,
  issuedByName: null,
  rows: {
    intensities: [],
    lifetimes: [
      {
        rowId: '0191c0de-0000-7000-8000-000000000002',
        use: 'all',
        structure: 'all',
        component: 'building',
        model: 'weibull',
        meanYears: 130,
        sdYears: 60,
        sharedCv: 0.2,
        source: 'an invented survey',
        provenance: 'from-memory',
        note: null,
      },
    ],
    densities: [],
    wasteCodes: [],
    suspicions: [],
  },
}

beforeEach(() => {
  call.mockReset()
  call.mockImplementation(({ method, path }: { method: string; path: string }) =>
    Promise.resolve(method === 'GET' ? (path.endsWith('editions') ? { editions: [draft] } : draft) : draft),
  )
})
afterEach(cleanup)

function show(): void {
  render(
    <ThemeProvider>
      <MessagesProvider messages={createMessages('en')}>
        <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
          <ToastProvider>
            <FactorBookScreen editionId={null} onChoose={vi.fn()} />
          </ToastProvider>
        </QueryClientProvider>
      </MessagesProvider>
    </ThemeProvider>,
  )
}
const sent = (method: string) => call.mock.calls.filter(([endpoint]) => endpoint.method === method)
const press = (name: RegExp | string) => fireEvent.click(screen.getByRole('button', { name }))

describe('a draft of the factor book', () => {
  it('sends a changed row only once every field holds, and says at the field what is wrong', async () => {
    show()
    fireEvent.click(await screen.findByRole('radio', { name: 'lifetimes' }))
    press('Change a row: lifetimes')
    const mean = screen.getByRole('textbox', { name: 'Mean life, years' })
    fireEvent.change(mean, { target: { value: '0' } })
    press('Save')

    expect(screen.getByText(/A life of zero years/)).toBeTruthy()
    expect(sent('PUT')).toEqual([])

    fireEvent.change(mean, { target: { value: '110' } })
    press('Save')
    await vi.waitFor(() => expect(sent('PUT')).toHaveLength(1))
    expect(sent('PUT')[0]?.[1].body).toMatchObject({ meanYears: 110, sdYears: 60, use: 'all', note: null })
  })

  it('is issued with number and note, after saying how much of it is unsourced', async () => {
    show()
    fireEvent.click(await screen.findByRole('button', { name: 'Issue the draft' }))
    const dialog = screen.getByRole('dialog')
    expect(within(dialog).getByText('1 row is from memory or common practice.')).toBeTruthy()
    press('Issue it')
    expect(within(dialog).getByText('Say in a sentence what is new in this edition.')).toBeTruthy()

    fireEvent.change(within(dialog).getByRole('textbox', { name: 'What is new in it' }), {
      target: { value: 'Lives.' },
    })
    press('Issue it')
    await vi.waitFor(() => expect(sent('POST')[0]?.[1].body).toEqual({ number: 2, note: 'Lives.' }))
  })

  it('is made only with a name', async () => {
    show()
    await screen.findByRole('button', { name: 'Issue the draft' })
    press('New draft')
    press('Make the draft')

    expect(screen.getByText(/Give the draft a name/)).toBeTruthy()
    expect(sent('POST')).toEqual([])
  })
})
