import { queryOptions } from '@tanstack/react-query'
import { listListings, listYardListings, readListing, readYardListing } from '@/shared/api/listings'
import { listPeople } from '@/shared/api/people'
import { readRunBuildings } from '@/shared/api/runs'
import type { ApiClient } from '@/sync/api/createApiClient'

/** Whose page it is: the planner's, with everything that came back, or a contractor's own. */
export type ListedSide = 'desk' | 'yard'

export const listedKeys = {
  all: (side: ListedSide) => ['listings', side] as const,
  one: (side: ListedSide, listingId: string) => ['listings', side, listingId] as const,
}

export const listingsQuery = (api: ApiClient, side: ListedSide) =>
  queryOptions({
    queryKey: listedKeys.all(side),
    queryFn: async ({ signal }) =>
      (await api.call(side === 'desk' ? listListings : listYardListings, {}, signal)).listings,
  })

export const listingQuery = (api: ApiClient, side: ListedSide, listingId: string) =>
  queryOptions({
    queryKey: listedKeys.one(side, listingId),
    queryFn: ({ signal }) =>
      api.call(side === 'desk' ? readListing : readYardListing, { params: { listingId } }, signal),
  })

export const buildingsOfRunQuery = (api: ApiClient, runId: string | null) =>
  queryOptions({
    queryKey: ['runs', runId, 'buildings'],
    queryFn: async ({ signal }) =>
      (await api.call(readRunBuildings, { params: { runId: runId ?? '' } }, signal)).buildings,
    enabled: runId !== null,
    staleTime: Infinity,
  })

export const contractorsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['people', 'contractor'],
    queryFn: async ({ signal }) => (await api.call(listPeople, { query: { role: 'contractor' } }, signal)).people,
  })
