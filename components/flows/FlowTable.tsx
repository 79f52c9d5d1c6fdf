import { receiptHref } from '@/components/receipts/receiptHref'
import { ReceiptLink } from '@/components/receipts/ReceiptLink'
import { csvText } from '@/components/ui/csvText'
import { DataTable, type Column } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import type { Material } from '@/shared/compute/factors/vocabulary'
import { formatCount, formatDecimal, formatMassFigure, massUnitFor } from '@/shared/format'
import { flowCsvRows, type FlowRow } from './flowRows'

interface FlowTableProps {
  readonly rows: readonly FlowRow[]
  readonly materials: readonly Material[]
  readonly fileName: string
  /** Where each figure comes from; none where two flows are added. */
  readonly receipt?: { readonly runId: string; readonly kind: 'demolition' | 'refurbishment' } | undefined
}

/** What comes out, year by year and material by material. */
export function FlowTable({ rows, materials, fileName, receipt }: FlowTableProps) {
  const { t, locale } = useMessages()
  const unit = massUnitFor(rows.map(({ totalKg }) => totalKg))
  const mass = (massKg: number | null | undefined): string =>
    formatMassFigure(massKg === null || massKg === undefined ? NaN : massKg, locale, unit)
  const figure = (massKg: number | undefined, year: number, material: Material | 'all', name: string) =>
    receipt && massKg !== undefined ? (
      <ReceiptLink
        text={mass(massKg)}
        what={`${name}, ${year}`}
        href={receiptHref({ ...receipt, material, fromYear: year, toYear: year })}
      />
    ) : (
      mass(massKg)
    )
  const columns: Column<FlowRow>[] = [
    { key: 'year', head: t('common.year'), cell: ({ year }) => String(year), sortBy: ({ year }) => year, minWidth: 64 },
    {
      key: 'total',
      head: t('yearsAhead.total'),
      cell: ({ year, totalKg }) => figure(totalKg, year, 'all', t('yearsAhead.total')),
      sortBy: ({ totalKg }) => totalKg,
      align: 'right',
    },
    { key: 'low', head: t('yearsAhead.low'), cell: ({ lowKg }) => mass(lowKg), align: 'right', minWidth: 72 },
    { key: 'high', head: t('yearsAhead.high'), cell: ({ highKg }) => mass(highKg), align: 'right', minWidth: 72 },
    ...materials.map((material): Column<FlowRow> => ({
      key: material,
      head: t(`vocabulary.material.${material}`),
      cell: ({ year, massKg }) => figure(massKg[material], year, material, t(`vocabulary.material.${material}`)),
      sortBy: ({ massKg }) => massKg[material] ?? null,
      align: 'right',
      minWidth: 96,
    })),
  ]
  const totals: Record<string, string> = {
    year: t('common.total'),
    total: mass(rows.reduce((sum, { totalKg }) => sum + totalKg, 0)),
  }
  for (const material of materials)
    totals[material] = mass(rows.reduce((sum, row) => sum + (row.massKg[material] ?? 0), 0))
  return (
    <Panel title={t('yearsAhead.byYear')} note={t('yearsAhead.unitNote', { unit })}>
      <DataTable
        label={t('yearsAhead.byYear')}
        rows={rows}
        rowKey={({ year }) => String(year)}
        columns={columns}
        totals={totals}
        onSaveCsv={() => downloadText(fileName, csvText(flowCsvRows(rows)), 'text/csv')}
      />
    </Panel>
  )
}

/** Buildings and floor area that are expected to come down, year by year. */
export function ExpectedTable({ rows, fileName }: Omit<FlowTableProps, 'materials'>) {
  const { t, locale } = useMessages()
  return (
    <Panel title={t('yearsAhead.expected')} note={t('yearsAhead.expectedNote')}>
      <DataTable
        label={t('yearsAhead.expected')}
        rows={rows}
        rowKey={({ year }) => String(year)}
        columns={[
          { key: 'year', head: t('common.year'), cell: ({ year }) => String(year), sortBy: ({ year }) => year },
          {
            key: 'buildings',
            head: t('yearsAhead.expectedBuildings'),
            cell: ({ expectedBuildings }) => formatDecimal(expectedBuildings, locale, 1),
            sortBy: ({ expectedBuildings }) => expectedBuildings,
            align: 'right',
          },
          {
            key: 'area',
            head: t('yearsAhead.expectedFloorArea'),
            cell: ({ expectedFloorAreaM2 }) => formatCount(expectedFloorAreaM2, locale),
            sortBy: ({ expectedFloorAreaM2 }) => expectedFloorAreaM2,
            align: 'right',
          },
        ]}
        totals={{
          year: t('common.total'),
          buildings: formatDecimal(
            rows.reduce((sum, { expectedBuildings }) => sum + expectedBuildings, 0),
            locale,
            1,
          ),
          area: formatCount(
            rows.reduce((sum, { expectedFloorAreaM2 }) => sum + expectedFloorAreaM2, 0),
            locale,
          ),
        }}
        onSaveCsv={() =>
          downloadText(
            fileName,
            csvText([
              ['year', 'expected_buildings', 'expected_floor_area_m2'],
              ...rows.map(({ year, expectedBuildings, expectedFloorAreaM2 }) => [
                year,
                expectedBuildings,
                expectedFloorAreaM2,
              ]),
            ]),
            'text/csv',
          )
        }
      />
    </Panel>
  )
}
