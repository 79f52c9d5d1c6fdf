import { useQuery } from '@tanstack/react-query'
import { useLocalSearchParams, useRouter } from 'expo-router'
import type { RunSummary } from '@/shared/schemas/run'
import { useApi } from '@/sync/react/SessionProvider'
import { runsQuery } from './runQueries'

export interface ChosenRun {
  readonly finished: readonly RunSummary[]
  /** The run of the address, or the newest finished one. */
  readonly run: RunSummary | null
  readonly isLoading: boolean
  readonly error: Error | null
  readonly retry: () => void
  readonly choose: (runId: string) => void
}

/** The finished runs and the chosen one, which is kept in the address as `?run=`. */
export function useChosenRun(): ChosenRun {
  const { run: wanted } = useLocalSearchParams<{ run?: string }>()
  const router = useRouter()
  const runs = useQuery(runsQuery(useApi()))
  const finished = (runs.data ?? []).filter(({ state }) => state === 'done')
  return {
    finished,
    run: finished.find(({ runId }) => runId === wanted) ?? finished[0] ?? null,
    isLoading: runs.isPending,
    error: runs.error,
    retry: () => void runs.refetch(),
    choose: (runId) => router.setParams({ run: runId }),
  }
}
