import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { useState, type ReactNode } from 'react'
import { LanguageProvider } from '@/components/ui/LanguageProvider'
import { ThemeProvider } from '@/components/ui/theme/ThemeProvider'
import { ToastProvider } from '@/components/ui/Toast'
import { ApiError } from '@/sync/api/ApiError'
import { SessionProvider } from '@/sync/react/SessionProvider'
import { openDeviceSession } from './deviceSession'

const MOST_RETRIES = 2

/** Look, texts, session and server reads for everything below. */
export function AppProviders({ children }: { readonly children: ReactNode }) {
  const [session] = useState(openDeviceSession)
  const [queries] = useState(
    () =>
      new QueryClient({
        defaultOptions: {
          queries: {
            staleTime: 30_000,
            networkMode: 'always',
            retry: (failures, error) => failures < MOST_RETRIES && !(error instanceof ApiError && error.status < 500),
          },
          mutations: { networkMode: 'always' },
        },
      }),
  )
  return (
    <ThemeProvider>
      <LanguageProvider>
        <SessionProvider store={session}>
          <QueryClientProvider client={queries}>
            <ToastProvider>{children}</ToastProvider>
          </QueryClientProvider>
        </SessionProvider>
      </LanguageProvider>
    </ThemeProvider>
  )
}
