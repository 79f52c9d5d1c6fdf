import { queryOptions } from '@tanstack/react-query'
import { readLoadReceipt, readReceipt } from '@/shared/api/receipts'
import type { ReceiptFigure } from '@/shared/schemas/receipt'
import type { ApiClient } from '@/sync/api/createApiClient'

/** The receipt of a figure; of a finished run, so it never changes. */
export const receiptQuery = (api: ApiClient, runId: string, figure: ReceiptFigure) =>
  queryOptions({
    queryKey: ['runs', runId, 'receipt', figure],
    queryFn: ({ signal }) => {
      const { kind, material, fromYear, toYear, use, structure, period, buildingId } = figure
      const query = {
        kind,
        material,
        fromYear: fromYear ?? undefined,
        toYear: toYear ?? undefined,
        use: use ?? undefined,
        structure: structure ?? undefined,
        period: period ?? undefined,
        buildingId: buildingId ?? undefined,
      }
      return api.call(readReceipt, { params: { runId }, query }, signal)
    },
    staleTime: Infinity,
  })

export interface LoadFigure {
  readonly code: string
  readonly year: number
  readonly containerM3: number
  readonly payloadT: number
}

/** The receipt of a line of a publication, which may be withdrawn at any time. */
export const loadReceiptQuery = (api: ApiClient, publicationId: string, query: LoadFigure) =>
  queryOptions({
    queryKey: ['yard', 'publications', publicationId, 'receipt', query],
    queryFn: ({ signal }) => api.call(readLoadReceipt, { params: { publicationId }, query }, signal),
  })
