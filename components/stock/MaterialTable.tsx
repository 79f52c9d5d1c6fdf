import { receiptHref } from '@/components/receipts/receiptHref'
import { ReceiptLink } from '@/components/receipts/ReceiptLink'
import { MaterialName } from '@/components/runs/MaterialName'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import { formatCount, formatDecimal, formatMassFigure, massUnitFor } from '@/shared/format'
import type { RunResult, RunSummary } from '@/shared/schemas/run'
import { materialCsvRows } from './stockCsv'

interface MaterialTableProps {
  readonly run: RunSummary
  readonly result: RunResult
}

/** Standing mass by material, with its band, its intensity and what its factor is worth. */
export function MaterialTable({ run, result }: MaterialTableProps) {
  const { t, locale } = useMessages()
  const { stock, basis } = result
  const rows = [...stock.byMaterial].sort((one, other) => other.band.meanKg - one.band.meanKg)
  const unit = massUnitFor(rows.map(({ band }) => band.p90Kg))
  const mass = (massKg: number): string => formatMassFigure(massKg, locale, unit)
  const intensity = (massKg: number): string =>
    basis.computedFloorAreaM2 > 0
      ? formatDecimal(massKg / basis.computedFloorAreaM2, locale, 1)
      : formatDecimal(NaN, locale, 1)
  return (
    <Panel title={t('stock.byMaterial')}>
      <DataTable
        label={t('stock.byMaterial')}
        rows={rows}
        rowKey={({ material }) => material}
        columns={[
          {
            key: 'material',
            head: t('common.material'),
            cell: ({ material }) => <MaterialName material={material} />,
            sortBy: ({ material }) => t(`vocabulary.material.${material}`),
            weight: 2,
            minWidth: 160,
          },
          {
            key: 'mass',
            head: t('stock.mass', { unit }),
            cell: ({ material, band }) => (
              <ReceiptLink
                text={mass(band.meanKg)}
                what={`${t(`vocabulary.material.${material}`)} ${t('stock.standing')}`}
                href={receiptHref({ runId: run.runId, kind: 'stock', material })}
              />
            ),
            sortBy: ({ band }) => band.meanKg,
            align: 'right',
          },
          { key: 'low', head: t('stock.low', { unit }), cell: ({ band }) => mass(band.p10Kg), align: 'right' },
          { key: 'high', head: t('stock.high', { unit }), cell: ({ band }) => mass(band.p90Kg), align: 'right' },
          {
            key: 'intensity',
            head: t('stock.intensity'),
            cell: ({ band }) => intensity(band.meanKg),
            sortBy: ({ band }) => band.meanKg,
            align: 'right',
          },
          {
            key: 'missing',
            head: t('stock.missing'),
            cell: ({ missingCount }) => formatCount(missingCount, locale),
            sortBy: ({ missingCount }) => missingCount,
            align: 'right',
            minWidth: 110,
          },
          {
            key: 'provenance',
            head: t('stock.provenance'),
            cell: ({ isFromMemory }) =>
              isFromMemory ? <Badge tone="attention" label={t('stock.fromMemory')} /> : t('stock.sourced'),
            minWidth: 120,
          },
        ]}
        totals={{
          material: t('common.total'),
          mass: mass(stock.total.meanKg),
          low: mass(stock.total.p10Kg),
          high: mass(stock.total.p90Kg),
          intensity: intensity(stock.total.meanKg),
        }}
        onSaveCsv={() =>
          downloadText(`run-${run.number}-stock-by-material.csv`, csvText(materialCsvRows(result)), 'text/csv')
        }
      />
      {rows.some(({ isFromMemory }) => isFromMemory) ? <AppText soft>{t('stock.fromMemoryNote')}</AppText> : null}
    </Panel>
  )
}
