import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { MaterialName } from '@/components/runs/MaterialName'
import { AppText } from '@/components/ui/AppText'
import { csvText } from '@/components/ui/csvText'
import { DataTable, type Column } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Select } from '@/components/ui/Select'
import { SPACE } from '@/components/ui/theme/tokens'
import { downloadText } from '@/components/ui/web/downloadText'
import { formatCount, formatDecimal, formatShare } from '@/shared/format'
import { factorRowKey } from '@/shared/factorBook/factorRowKey'
import type { Messages } from '@/shared/messages/messages.types'
import type { IntensityRow } from '@/shared/schemas/factorBook'
import { factorCsvRows } from './factorCsvRows'
import { FILTER_WORDS, factorNames } from './factorNames'
import { filteredIntensities, type IntensityFilter } from './filteredIntensities'
import { sourceColumns } from './sourceColumns'

interface IntensityTableProps {
  readonly rows: readonly IntensityRow[]
  readonly fileName: string
  /** In a draft: opens a row to change it. */
  readonly onChange?: ((row: IntensityRow) => void) | undefined
}

/** Kilograms per square metre, narrowed by structure, use and material. */
export function IntensityTable({ rows, fileName, onChange }: IntensityTableProps) {
  const messages = useMessages()
  const { t } = messages
  const names = factorNames(messages)
  const [filter, setFilter] = useState<IntensityFilter>({ structure: 'all', use: 'all', material: 'all' })
  const found = filteredIntensities(rows, filter)
  const options = {
    structure: FILTER_WORDS.structure.map((value) => ({ value, label: names.structure(value) })),
    use: FILTER_WORDS.use.map((value) => ({ value, label: names.use(value) })),
    material: FILTER_WORDS.material.map((value) => ({
      value,
      label: value === 'all' ? t('factorBook.anyMaterial') : names.material(value),
    })),
  }
  return (
    <Panel title={t('factorBook.intensities')} note={t('factorBook.count', { count: found.length })}>
      <View style={styles.row}>
        {(['structure', 'use', 'material'] as const).map((field) => (
          <View key={field} style={styles.field}>
            <Select<string>
              label={t(`factorBook.${field}`)}
              options={options[field]}
              value={filter[field]}
              onChange={(value) => setFilter({ ...filter, [field]: value })}
            />
          </View>
        ))}
      </View>
      <AppText soft>{t('factorBook.missingNote')}</AppText>
      <DataTable
        label={t('factorBook.intensities')}
        rows={found}
        rowKey={({ rowId }) => rowId}
        columns={intensityColumns(messages)}
        onPressRow={onChange}
        rowLabel={(row) => t('factorBook.changeRow', { key: factorRowKey('intensities', row) })}
        empty={<EmptyState title={t('factorBook.noRows')} text={t('factorBook.noRowsText')} />}
        onSaveCsv={() => downloadText(fileName, csvText(factorCsvRows(found)), 'text/csv')}
      />
    </Panel>
  )
}

function intensityColumns(messages: Messages): Column<IntensityRow>[] {
  const { t, locale } = messages
  const names = factorNames(messages)
  const figure = (value: number | null): string =>
    value === null ? t('factorBook.missing') : formatDecimal(value, locale, 1)
  const optional = (value: number | null, decimals: number): string => formatDecimal(value ?? NaN, locale, decimals)
  return [
    {
      key: 'material',
      head: t('factorBook.material'),
      cell: ({ material }) => <MaterialName material={material} />,
      sortBy: ({ material }) => names.material(material),
      minWidth: 150,
    },
    {
      key: 'structure',
      head: t('factorBook.structure'),
      cell: ({ structure }) => names.structure(structure),
      sortBy: ({ structure }) => names.structure(structure),
      minWidth: 130,
    },
    { key: 'use', head: t('factorBook.use'), cell: ({ use }) => names.use(use), minWidth: 110 },
    { key: 'period', head: t('factorBook.period'), cell: ({ period }) => names.period(period) },
    { key: 'component', head: t('factorBook.component'), cell: ({ component }) => names.component(component) },
    { key: 'region', head: t('factorBook.region'), cell: ({ region }) => region },
    {
      key: 'basis',
      head: t('factorBook.basis'),
      cell: ({ areaBasis }) => t(`vocabulary.areaBasis.${areaBasis}`),
    },
    {
      key: 'median',
      head: t('factorBook.median'),
      cell: ({ medianKgPerM2 }) => figure(medianKgPerM2),
      sortBy: ({ medianKgPerM2 }) => medianKgPerM2,
      align: 'right',
    },
    {
      key: 'mean',
      head: t('factorBook.mean'),
      cell: ({ meanKgPerM2 }) => optional(meanKgPerM2, 1),
      align: 'right',
      minWidth: 64,
    },
    {
      key: 'p10',
      head: t('factorBook.p10'),
      cell: ({ p10KgPerM2 }) => optional(p10KgPerM2, 1),
      align: 'right',
      minWidth: 64,
    },
    {
      key: 'p90',
      head: t('factorBook.p90'),
      cell: ({ p90KgPerM2 }) => optional(p90KgPerM2, 1),
      align: 'right',
      minWidth: 64,
    },
    {
      key: 'gsd',
      head: t('factorBook.gsd'),
      cell: ({ gsdBetweenBuildings }) => optional(gsdBetweenBuildings, 2),
      align: 'right',
      minWidth: 100,
    },
    {
      key: 'cv',
      head: t('factorBook.sharedCv'),
      cell: ({ sharedCv }) => formatShare(sharedCv, locale),
      align: 'right',
      minWidth: 80,
    },
    {
      key: 'samples',
      head: t('factorBook.samples'),
      cell: ({ sampleCount }) => formatCount(sampleCount ?? NaN, locale),
      align: 'right',
      minWidth: 80,
    },
    ...sourceColumns<IntensityRow>(messages),
  ]
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.medium },
  field: { flexGrow: 1, flexBasis: 150, maxWidth: 320 },
})
