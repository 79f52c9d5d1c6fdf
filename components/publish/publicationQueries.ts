import { queryOptions } from '@tanstack/react-query'
import { listPeople } from '@/shared/api/people'
import { listPublications } from '@/shared/api/publications'
import type { ApiClient } from '@/sync/api/createApiClient'

/** What was published, to whom, and what was withdrawn. */
export const publicationsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['publications'],
    queryFn: async ({ signal }) => (await api.call(listPublications, {}, signal)).publications,
  })

/** The contractors a run can be published to. */
export const contractorsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['people', 'contractor'],
    queryFn: async ({ signal }) => (await api.call(listPeople, { query: { role: 'contractor' } }, signal)).people,
  })
