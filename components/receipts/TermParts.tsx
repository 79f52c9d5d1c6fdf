import { MaterialName } from '@/components/runs/MaterialName'
import { AppText } from '@/components/ui/AppText'
import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import { formatCount, formatDecimal, formatMassFigure, massUnitFor } from '@/shared/format'
import type { Receipt } from '@/shared/schemas/receipt'
import { componentName } from './receiptNames'
import { termTotals } from './termTotals'

/** Floor area × content = mass, line by line, and what the book does not know. */
export function TermParts({ receipt: { groups, massKg, run } }: { readonly receipt: Receipt }) {
  const { t, locale } = useMessages()
  const terms = termTotals(groups)
  const unit = massUnitFor([massKg])
  const missing = [...new Set(groups.flatMap((group) => group.missing))]
  return (
    <Panel title={t('receipts.terms')} note={t('receipts.termsNote')}>
      <DataTable
        label={t('receipts.terms')}
        rows={terms}
        rowKey={({ material, component }) => `${material}/${component}`}
        columns={[
          {
            key: 'material',
            head: t('common.material'),
            cell: ({ material }) => <MaterialName material={material} />,
            weight: 2,
            minWidth: 150,
          },
          {
            key: 'part',
            head: t('receipts.part'),
            cell: ({ component }) => componentName(component, t),
            minWidth: 110,
          },
          {
            key: 'area',
            head: t('receipts.countedArea'),
            cell: ({ countedAreaM2 }) => formatDecimal(countedAreaM2, locale, countedAreaM2 < 100 ? 1 : 0),
            align: 'right',
          },
          {
            key: 'content',
            head: t('receipts.content'),
            cell: ({ contentKgPerM2 }) => formatDecimal(contentKgPerM2, locale, 2),
            sortBy: ({ contentKgPerM2 }) => contentKgPerM2,
            align: 'right',
          },
          {
            key: 'mass',
            head: t('receipts.mass', { unit }),
            cell: (term) => formatMassFigure(term.massKg, locale, unit),
            sortBy: (term) => term.massKg,
            align: 'right',
          },
          {
            key: 'rows',
            head: t('receipts.rows'),
            cell: ({ rowCount }) => formatCount(rowCount, locale),
            align: 'right',
          },
        ]}
        totals={{ material: t('common.total'), mass: formatMassFigure(massKg, locale, unit) }}
        onSaveCsv={() =>
          downloadText(
            `run-${run.number}-receipt-lines.csv`,
            csvText([
              ['material', 'part', 'counted_area_m2', 'content_kg_per_m2', 'mass_kg', 'factor_rows'],
              ...terms.map((term) => [
                term.material,
                term.component,
                term.countedAreaM2,
                term.contentKgPerM2,
                term.massKg,
                term.rowIds.join(' '),
              ]),
            ]),
            'text/csv',
          )
        }
      />
      {missing.length > 0 ? (
        <AppText tone="attention">
          {t('receipts.missing', {
            materials: missing.map((material) => t(`vocabulary.material.${material}`)).join(', '),
          })}
        </AppText>
      ) : null}
    </Panel>
  )
}
