import { queryOptions } from '@tanstack/react-query'
import { listDistricts, readDistrictOutlines } from '@/shared/api/outlines'
import type { ApiClient } from '@/sync/api/createApiClient'

/** The districts of the organisation. */
export const districtsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['districts'],
    queryFn: async ({ signal }) => (await api.call(listDistricts, {}, signal)).districts,
  })

/** Outlines of a district. */
export const districtOutlinesQuery = (api: ApiClient, districtId: string) =>
  queryOptions({
    queryKey: ['districts', districtId, 'outlines'],
    queryFn: async ({ signal }) => (await api.call(readDistrictOutlines, { params: { districtId } }, signal)).features,
    staleTime: 5 * 60_000,
  })
