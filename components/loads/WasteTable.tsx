import { StyleSheet, View } from 'react-native'
import { ReceiptLink } from '@/components/receipts/ReceiptLink'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { csvText } from '@/components/ui/csvText'
import { DataTable, type Column } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import { downloadText } from '@/components/ui/web/downloadText'
import type { WasteLine } from '@/shared/api/publications'
import { formatCount, formatMassFigure, formatVolume } from '@/shared/format'
import type { CodeTotal } from './codeTotals'
import { loadCsvRows } from './loadCsvRows'

type Row = CodeTotal & { readonly year?: number }

interface WasteTableProps {
  readonly label: string
  readonly rows: readonly (WasteLine | CodeTotal)[]
  readonly hasYears: boolean
  readonly fileName: string
  /** Address of the receipt of a line. */
  readonly receiptHrefOf?: (line: { readonly code: string; readonly year: number }) => string
}

/** Tonnes, loose cubic metres and loads by waste code, each as low, likely and high. */
export function WasteTable({ label, rows, hasYears, fileName, receiptHrefOf }: WasteTableProps) {
  const { t, locale } = useMessages()
  const volume = (volumeM3: number): string => formatVolume(volumeM3, locale).replace(/\u00a0m³$/, '')
  const figures = (
    [
      ['mass', 'massKg', (value: number) => formatMassFigure(value, locale, 't')],
      ['volume', 'looseVolumeM3', volume],
      ['loads', 'loads', (value: number) => formatCount(value, locale)],
    ] as const
  ).flatMap(([head, field, write]): Column<Row>[] => [
    {
      key: `${head}Low`,
      head: t(`loads.${head}Low`),
      cell: (row) => write(row[field].low),
      align: 'right',
      minWidth: 68,
    },
    {
      key: head,
      head: t(`loads.${head}`),
      cell: (row) =>
        receiptHrefOf && row.year !== undefined && field === 'massKg' ? (
          <ReceiptLink
            bold
            text={write(row[field].likely)}
            what={`${row.code} ${row.text}, ${row.year}`}
            href={receiptHrefOf({ code: row.code, year: row.year })}
          />
        ) : (
          <AppText kind="number" weight="semibold" align="right">
            {write(row[field].likely)}
          </AppText>
        ),
      sortBy: (row) => row[field].likely,
      align: 'right',
      minWidth: 76,
    },
    {
      key: `${head}High`,
      head: t(`loads.${head}High`),
      cell: (row) => write(row[field].high),
      align: 'right',
      minWidth: 68,
    },
  ])
  const year: Column<Row> = {
    key: 'year',
    head: t('common.year'),
    cell: (row) => String(row.year ?? ''),
    sortBy: (row) => row.year ?? null,
    minWidth: 64,
  }
  return (
    <DataTable<Row>
      label={label}
      rows={rows}
      rowKey={(row) => `${row.year ?? ''}/${row.code}/${row.materials.join()}`}
      columns={[
        ...(hasYears ? [year] : []),
        { key: 'code', head: t('loads.code'), cell: ({ code }) => code, sortBy: ({ code }) => code, minWidth: 92 },
        {
          key: 'what',
          head: t('loads.what'),
          cell: (row) => <Waste row={row} />,
          weight: 3,
          minWidth: 190,
        },
        ...figures,
      ]}
      empty={<EmptyState title={t('loads.nothingInRange')} text={t('loads.nothingInRangeText')} />}
      onSaveCsv={() => downloadText(fileName, csvText(loadCsvRows(rows)), 'text/csv')}
    />
  )
}

function Waste({ row }: { readonly row: Row }) {
  const { t } = useMessages()
  return (
    <View style={styles.waste}>
      <AppText kind="number">{row.text}</AppText>
      {row.isHazardous ? <Badge tone="error" label={t('loads.hazardous')} /> : null}
      {row.mirrorHazardousCode === null ? null : (
        <Badge tone="attention" label={t('loads.mirror', { code: row.mirrorHazardousCode })} />
      )}
    </View>
  )
}

const styles = StyleSheet.create({ waste: { gap: SPACE.tight } })
