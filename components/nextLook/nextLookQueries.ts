import { queryOptions } from '@tanstack/react-query'
import { readNextLook } from '@/shared/api/nextLook'
import { readDistrictOutlines } from '@/shared/api/outlines'
import { listRounds } from '@/shared/api/rounds'
import type { ChosenLookFigure } from '@/shared/schemas/nextLook'
import type { ApiClient } from '@/sync/api/createApiClient'

/** Rounds that can be ranked. */
export const lookRoundsQuery = (api: ApiClient) =>
  queryOptions({
    queryKey: ['rounds', 'for-looks'],
    queryFn: async ({ signal }) => (await api.call(listRounds, {}, signal)).rounds,
  })

/** The ranking of a round for a figure; without one, for the figure the phones work for. */
export const nextLookQuery = (api: ApiClient, roundId: string, figure: ChosenLookFigure | null) =>
  queryOptions({
    queryKey: ['rounds', roundId, 'next-look', figure],
    queryFn: ({ signal }) => {
      const query = figure ? { material: figure.material, byYear: figure.byYear ?? undefined } : {}
      return api.call(readNextLook, { params: { roundId }, query }, signal)
    },
  })

/** Outlines to shade. */
export const lookOutlinesQuery = (api: ApiClient, districtId: string) =>
  queryOptions({
    queryKey: ['districts', districtId, 'outlines', 'for-looks'],
    queryFn: async ({ signal }) => (await api.call(readDistrictOutlines, { params: { districtId } }, signal)).features,
    staleTime: 5 * 60_000,
  })
