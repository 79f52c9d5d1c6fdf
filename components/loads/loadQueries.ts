import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import { listYardPublications, readLoadsAhead } from '@/shared/api/publications'
import { readYardPlan } from '@/shared/api/yard'
import type { ApiClient } from '@/sync/api/createApiClient'

/** What one vehicle carries. */
export interface Fleet {
  readonly containerM3: number
  readonly payloadT: number
}

/** What was published to me. */
export const yardPublicationsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['yard', 'publications'],
    queryFn: async ({ signal }) => (await api.call(listYardPublications, {}, signal)).publications,
  })

/** One publication counted in my vehicles; the last count stays in sight while a new one is made. */
export const loadsAheadQuery = (api: ApiClient, publicationId: string, fleet: Fleet) =>
  queryOptions({
    queryKey: ['yard', 'publications', publicationId, fleet],
    queryFn: ({ signal }) => api.call(readLoadsAhead, { params: { publicationId }, query: { ...fleet } }, signal),
    placeholderData: keepPreviousData,
  })

/** My vehicles, plant and recovery shares. */
export const yardPlanQuery = (api: ApiClient) =>
  queryOptions({ queryKey: ['yard', 'plan'], queryFn: ({ signal }) => api.call(readYardPlan, {}, signal) })
