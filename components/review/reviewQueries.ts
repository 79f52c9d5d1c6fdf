import { queryOptions } from '@tanstack/react-query'
import { readSheet, reviewQueue } from '@/shared/api/review'
import { listRounds } from '@/shared/api/rounds'
import type { SheetState } from '@/shared/schemas/sheet'
import type { ApiClient } from '@/sync/api/createApiClient'

export const reviewKeys = {
  all: ['review'] as const,
  sheet: (sheetId: string) => ['review', 'sheet', sheetId] as const,
}

export interface QueueFilter {
  readonly roundId: string | null
  readonly state: SheetState
}

export const queueQuery = (api: ApiClient, { roundId, state }: QueueFilter) =>
  queryOptions({
    queryKey: [...reviewKeys.all, 'queue', { roundId, state }],
    queryFn: ({ signal }) =>
      api.call(reviewQueue, { query: { state, ...(roundId === null ? {} : { roundId }) } }, signal),
    staleTime: 0,
  })

export const sheetQuery = (api: ApiClient, sheetId: string) =>
  queryOptions({
    queryKey: reviewKeys.sheet(sheetId),
    queryFn: ({ signal }) => api.call(readSheet, { params: { sheetId } }, signal),
    staleTime: 0,
  })

export const reviewRoundsQuery = (api: ApiClient) =>
  queryOptions({ queryKey: ['rounds'], queryFn: ({ signal }) => api.call(listRounds, {}, signal) })

/** A stored picture as an address the page can show; it lives as long as the query. */
export const photoQuery = (api: ApiClient, photoId: string) =>
  queryOptions({
    queryKey: ['photo', photoId],
    queryFn: async () => URL.createObjectURL(await (await api.send('GET', `/photos/${photoId}?size=full`)).blob()),
    staleTime: Infinity,
  })
