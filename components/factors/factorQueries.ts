import { queryOptions } from '@tanstack/react-query'
import { listEditions, readEdition } from '@/shared/api/factorBook'
import type { ApiClient } from '@/sync/api/createApiClient'

/** Editions of the factor book, newest first. */
export const editionsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['factor-book', 'editions'],
    queryFn: async ({ signal }) => (await api.call(listEditions, {}, signal)).editions,
  })

/** All rows of an edition; an issued one never changes. */
export const editionQuery = (api: ApiClient, editionId: string) =>
  queryOptions({
    queryKey: ['factor-book', 'editions', editionId],
    queryFn: ({ signal }) => api.call(readEdition, { params: { editionId } }, signal),
    staleTime: ({ state }) => (state.data?.state === 'issued' ? Infinity : 0),
  })
