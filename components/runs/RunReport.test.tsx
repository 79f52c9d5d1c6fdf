import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import type { ReactNode } from 'react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { MessagesProvider } from '@/components/ui/MessagesProvider'
import { ThemeProvider } from '@/components/ui/theme/ThemeProvider'
import { ToastProvider } from '@/components/ui/Toast'
import { createMessages } from '@/shared/messages/createMessages'
import { RunReport } from './RunReport'
import { exampleResult, exampleRun } from './runExample'

vi.mock('expo-router', () => ({
  useLocalSearchParams: () => ({}),
  useRouter: () => ({ setParams: vi.fn() }),
}))
const call = vi.fn()
vi.mock('@/sync/react/SessionProvider', () => ({ useApi: () => ({ call }) }))

afterEach(() => {
  cleanup()
  call.mockReset()
})

const show = (children: ReactNode) =>
  render(
    <ThemeProvider>
      <MessagesProvider messages={createMessages('en')}>
        <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
          <ToastProvider>{children}</ToastProvider>
        </QueryClientProvider>
      </MessagesProvider>
    </ThemeProvider>,
  )

describe('RunReport', () => {
  it('tells what to do first when there is no finished run, and opens the way to one', async () => {
    call.mockResolvedValue({ runs: [], rounds: [], editions: [] })
    show(<RunReport title="Stock">{() => null}</RunReport>)

    expect(await screen.findByText('There is no finished run yet')).toBeTruthy()
    fireEvent.click(screen.getByRole('button', { name: 'New run' }))
    fireEvent.click(await screen.findByRole('button', { name: 'Compute' }))
    expect(await screen.findByText('Choose a round.')).toBeTruthy()
  })

  it('shows the figures with everything they rest on', async () => {
    call.mockImplementation((endpoint: { path: string }) =>
      Promise.resolve(endpoint.path === '/runs' ? { runs: [exampleRun] } : { ...exampleRun, result: exampleResult }),
    )
    show(<RunReport title="Stock">{() => 'the figures'}</RunReport>)

    expect(await screen.findByText('the figures')).toBeTruthy()
    expect(screen.getByText(/is below the usual 0.1 to 1 %/)).toBeTruthy()
    expect(screen.getByText('middle of the year (o = 0.5)')).toBeTruthy()
    expect(screen.getByText(/expectations for the group, not for a building/)).toBeTruthy()
    expect(screen.getByText(/80 of 100 buildings/)).toBeTruthy()
    expect(screen.getByRole('group', { name: 'Title block' })).toBeTruthy()
  })
})
