import { queryOptions } from '@tanstack/react-query'
import { listRounds } from '@/shared/api/rounds'
import { listEditions } from '@/shared/api/factorBook'
import { listRuns, readRun, readRunBuildings } from '@/shared/api/runs'
import type { ApiClient } from '@/sync/api/createApiClient'

/** How often a run that is not done is asked for [ms]. */
const ASK_AGAIN_MS = 1_500

/** The runs of the organisation, newest first. */
export const runsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['runs'],
    queryFn: async ({ signal }) => (await api.call(listRuns, {}, signal)).runs,
  })

/** One run; asked for again while it is being computed, and never again once it is done. */
export const runQuery = (api: ApiClient, runId: string) =>
  queryOptions({
    queryKey: ['runs', runId],
    queryFn: ({ signal }) => api.call(readRun, { params: { runId } }, signal),
    staleTime: ({ state }) => (state.data?.state === 'done' ? Infinity : 0),
    refetchInterval: ({ state }) =>
      state.data === undefined || state.data.state === 'queued' || state.data.state === 'running'
        ? ASK_AGAIN_MS
        : false,
  })

/** Each building of a finished run. */
export const runBuildingsQuery = (api: ApiClient, runId: string) =>
  queryOptions({
    queryKey: ['runs', runId, 'buildings'],
    queryFn: async ({ signal }) => (await api.call(readRunBuildings, { params: { runId } }, signal)).buildings,
    staleTime: Infinity,
  })

/** Rounds a run can be made of. */
export const runRoundsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['rounds', 'for-runs'],
    queryFn: async ({ signal }) => (await api.call(listRounds, {}, signal)).rounds,
  })

/** Editions a run can rest on. */
export const runEditionsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['factor-book', 'editions'],
    queryFn: async ({ signal }) => (await api.call(listEditions, {}, signal)).editions,
  })
