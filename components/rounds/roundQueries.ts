import { queryOptions } from '@tanstack/react-query'
import { listDistricts, previewImport, readDistrictBlocks, readDistrictOutlines } from '@/shared/api/outlines'
import { listPeople } from '@/shared/api/people'
import { listRounds, readRound } from '@/shared/api/rounds'
import type { ApiClient } from '@/sync/api/createApiClient'

export const roundKeys = {
  all: ['rounds'] as const,
  one: (roundId: string) => ['rounds', roundId] as const,
  districts: ['districts'] as const,
}

export const roundsQuery = (api: ApiClient) =>
  queryOptions({ queryKey: roundKeys.all, queryFn: () => api.call(listRounds) })

export const roundQuery = (api: ApiClient, roundId: string) =>
  queryOptions({ queryKey: roundKeys.one(roundId), queryFn: () => api.call(readRound, { params: { roundId } }) })

export const districtsQuery = (api: ApiClient) =>
  queryOptions({ queryKey: roundKeys.districts, queryFn: () => api.call(listDistricts) })

export const districtOutlinesQuery = (api: ApiClient, districtId: string | undefined) =>
  queryOptions({
    queryKey: [...roundKeys.districts, districtId, 'outlines'],
    queryFn: () => api.call(readDistrictOutlines, { params: { districtId: districtId! } }),
    enabled: districtId !== undefined,
    staleTime: Infinity,
  })

export const districtBlocksQuery = (api: ApiClient, districtId: string | undefined) =>
  queryOptions({
    queryKey: [...roundKeys.districts, districtId, 'blocks'],
    queryFn: () => api.call(readDistrictBlocks, { params: { districtId: districtId! } }),
    enabled: districtId !== undefined,
    staleTime: Infinity,
  })

export const surveyorsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['people', 'surveyor'],
    queryFn: () => api.call(listPeople, { query: { role: 'surveyor' } }),
  })

export const importPreviewQuery = (api: ApiClient, importId: string) =>
  queryOptions({
    queryKey: ['outline-imports', importId],
    queryFn: () => api.call(previewImport, { params: { importId } }),
    staleTime: Infinity,
  })
