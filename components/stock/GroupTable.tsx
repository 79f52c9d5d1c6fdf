import { receiptHref } from '@/components/receipts/receiptHref'
import { ReceiptLink } from '@/components/receipts/ReceiptLink'
import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import { formatCount, formatDecimal, formatMassFigure, formatShare, massUnitFor } from '@/shared/format'
import type { RunSummary, StockCell } from '@/shared/schemas/run'
import { groupCsvRows } from './stockCsv'
import { stockGroups, type StockDimension } from './stockGroups'

interface GroupTableProps {
  readonly run: RunSummary
  readonly title: string
  readonly dimension: StockDimension
  readonly cells: readonly StockCell[]
  /** Name of a use, structure or period. */
  readonly nameOf: (key: string) => string
}

/** The stock along one dimension. */
export function GroupTable({ run, title, dimension, cells, nameOf }: GroupTableProps) {
  const { t, locale } = useMessages()
  const groups = stockGroups(cells, dimension)
  const totalKg = groups.reduce((sum, { massKg }) => sum + massKg, 0)
  const totalM2 = groups.reduce((sum, { floorAreaM2 }) => sum + floorAreaM2, 0)
  const totalCount = groups.reduce((sum, { buildingCount }) => sum + buildingCount, 0)
  const unit = massUnitFor([totalKg])
  const intensity = (massKg: number, areaM2: number): string =>
    formatDecimal(areaM2 > 0 ? massKg / areaM2 : NaN, locale, 0)
  return (
    <Panel title={title}>
      <DataTable
        label={title}
        rows={groups}
        rowKey={({ key }) => key}
        columns={[
          {
            key: 'name',
            head: t(`stock.${dimension}`),
            cell: ({ key }) => nameOf(key),
            sortBy: ({ key }) => nameOf(key),
            weight: 2,
            minWidth: 150,
          },
          {
            key: 'count',
            head: t('stock.buildingCount'),
            cell: ({ buildingCount }) => formatCount(buildingCount, locale),
            sortBy: ({ buildingCount }) => buildingCount,
            align: 'right',
          },
          {
            key: 'area',
            head: t('stock.floorArea'),
            cell: ({ floorAreaM2 }) => formatCount(floorAreaM2, locale),
            sortBy: ({ floorAreaM2 }) => floorAreaM2,
            align: 'right',
            minWidth: 100,
          },
          {
            key: 'mass',
            head: t('stock.mass', { unit }),
            cell: ({ key, massKg }) => (
              <ReceiptLink
                text={formatMassFigure(massKg, locale, unit)}
                what={`${nameOf(key)} ${t('stock.standing')}`}
                href={receiptHref({ runId: run.runId, kind: 'stock', [dimension]: key })}
              />
            ),
            sortBy: ({ massKg }) => massKg,
            align: 'right',
          },
          {
            key: 'intensity',
            head: t('stock.intensity'),
            cell: ({ massKg, floorAreaM2 }) => intensity(massKg, floorAreaM2),
            align: 'right',
          },
          {
            key: 'share',
            head: t('stock.shareOfMass'),
            cell: ({ massKg }) => formatShare(totalKg > 0 ? massKg / totalKg : NaN, locale),
            align: 'right',
          },
        ]}
        totals={{
          name: t('common.total'),
          count: formatCount(totalCount, locale),
          area: formatCount(totalM2, locale),
          mass: formatMassFigure(totalKg, locale, unit),
          intensity: intensity(totalKg, totalM2),
        }}
        onSaveCsv={() =>
          downloadText(
            `run-${run.number}-stock-by-${dimension}.csv`,
            csvText(groupCsvRows(dimension, groups)),
            'text/csv',
          )
        }
      />
    </Panel>
  )
}
