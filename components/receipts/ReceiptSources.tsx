import { MaterialName } from '@/components/runs/MaterialName'
import { Badge } from '@/components/ui/Badge'
import type { Column } from '@/components/ui/DataTable'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { STRUCTURES, USES, type Provenance } from '@/shared/compute/factors/vocabulary'
import { formatCount, formatDecimal, formatShare } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { Receipt } from '@/shared/schemas/receipt'
import { componentName, periodName } from './receiptNames'

/** Source and kind of source, at the end of a row. */
export function sourceColumns<Row extends { readonly source: string; readonly provenance: Provenance }>({
  t,
}: Messages): Column<Row>[] {
  return [
    {
      key: 'source',
      head: t('receipts.source'),
      cell: ({ source }) => source,
      sortBy: ({ source }) => source,
      weight: 3,
      minWidth: 220,
    },
    {
      key: 'provenance',
      head: t('receipts.provenance'),
      cell: ({ provenance }) => (
        <Badge
          tone={provenance === 'published' || provenance === 'open-dataset' ? 'good' : 'attention'}
          label={t(`vocabulary.provenance.${provenance}`)}
        />
      ),
      minWidth: 130,
    },
  ]
}

/** The rows of the factor book that the figure rests on. */
export function FactorSources({ receipt: { factorRows } }: { readonly receipt: Receipt }) {
  const messages = useMessages()
  const { t, locale } = messages
  const number = (value: number | null): string => (value === null ? '–' : formatDecimal(value, locale, 2))
  return (
    <Panel title={t('receipts.factorRows')}>
      <DataTable
        label={t('receipts.factorRows')}
        rows={factorRows}
        rowKey={({ rowId }) => rowId}
        columns={[
          {
            key: 'material',
            head: t('common.material'),
            cell: ({ material }) => <MaterialName material={material} />,
            minWidth: 140,
          },
          {
            key: 'part',
            head: t('receipts.part'),
            cell: ({ component }) => componentName(component, t),
            minWidth: 100,
          },
          { key: 'kind', head: t('receipts.groups'), cell: (row) => kindName(row, t), weight: 2, minWidth: 150 },
          { key: 'mean', head: t('receipts.mean'), cell: ({ meanKgPerM2 }) => number(meanKgPerM2), align: 'right' },
          {
            key: 'median',
            head: t('receipts.median'),
            cell: ({ medianKgPerM2 }) => number(medianKgPerM2),
            align: 'right',
          },
          {
            key: 'error',
            head: t('receipts.sharedCv'),
            cell: ({ sharedCv }) => formatShare(sharedCv, locale),
            align: 'right',
          },
          {
            key: 'samples',
            head: t('receipts.samples'),
            cell: ({ sampleCount }) => (sampleCount === null ? '–' : formatCount(sampleCount, locale)),
            align: 'right',
          },
          ...sourceColumns<Receipt['factorRows'][number]>(messages),
        ]}
      />
    </Panel>
  )
}

/** The lives behind the chances of a flow. */
export function LifetimeSources({ receipt: { lifetimes } }: { readonly receipt: Receipt }) {
  const messages = useMessages()
  const { t, locale } = messages
  return (
    <Panel title={t('receipts.lifetimes')}>
      <DataTable
        label={t('receipts.lifetimes')}
        rows={lifetimes}
        rowKey={({ lifetimeId }) => lifetimeId}
        columns={[
          { key: 'of', head: t('receipts.life'), cell: ({ component }) => componentName(component, t), minWidth: 110 },
          {
            key: 'kind',
            head: t('receipts.groups'),
            cell: (row) => kindName({ ...row, period: 'all' }, t),
            weight: 2,
            minWidth: 140,
          },
          { key: 'model', head: t('receipts.model'), cell: ({ model }) => model, minWidth: 100 },
          {
            key: 'mean',
            head: t('receipts.meanYears'),
            cell: ({ meanYears }) => formatDecimal(meanYears, locale, 1),
            align: 'right',
          },
          {
            key: 'sd',
            head: t('receipts.sdYears'),
            cell: ({ sdYears }) => formatDecimal(sdYears, locale, 1),
            align: 'right',
          },
          {
            key: 'scenario',
            head: t('receipts.ofScenario'),
            cell: ({ isOfScenario }) =>
              isOfScenario ? <Badge tone="attention" label={t('receipts.ofScenario')} /> : '–',
            minWidth: 130,
          },
          ...sourceColumns<Receipt['lifetimes'][number]>(messages),
        ]}
      />
    </Panel>
  )
}

interface Kind {
  readonly use: string
  readonly structure: string
  readonly period: string
}

function kindName({ use, structure, period }: Kind, t: Messages['t']): string {
  const knownUse = USES.find((one) => one === use)
  const knownStructure = STRUCTURES.find((one) => one === structure)
  const parts = [
    ...(knownUse ? [t(`vocabulary.use.${knownUse}`)] : []),
    ...(knownStructure ? [t(`vocabulary.structure.${knownStructure}`)] : []),
    ...(period === 'all' ? [] : [periodName(period, t)]),
  ]
  return parts.length > 0 ? parts.join(', ') : t('factorBook.any')
}
