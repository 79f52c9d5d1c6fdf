import { useMemo } from 'react'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { formatCount, formatRange } from '@/shared/format'
import type { IntensityRow } from '@/shared/schemas/factorBook'
import { archetypeSums } from './archetypeSums'
import { factorNames } from './factorNames'

/** Sum of the factors of each kind of building beside the range of published whole buildings; outside it, a warning. */
export function PlausibilityPanel({ rows }: { readonly rows: readonly IntensityRow[] }) {
  const messages = useMessages()
  const { t, locale } = messages
  const names = factorNames(messages)
  const sums = useMemo(() => archetypeSums(rows), [rows])
  if (sums.length === 0) return null
  const outsideCount = sums.filter(({ verdict }) => verdict !== 'within').length
  const count = (value: number): string => formatCount(value, locale)
  return (
    <Panel
      title={t('factorBook.plausibility')}
      note={t('factorBook.outsideCount', { count: outsideCount })}
      tone={outsideCount > 0 ? 'attention' : 'ink'}
    >
      <AppText soft>{t('factorBook.plausibilityNote')}</AppText>
      <DataTable
        label={t('factorBook.plausibility')}
        rows={[...sums].sort((a, b) => Number(a.verdict === 'within') - Number(b.verdict === 'within'))}
        rowKey={({ key }) => key}
        pageSize={12}
        columns={[
          {
            key: 'structure',
            head: t('factorBook.structure'),
            cell: ({ structure }) => names.structure(structure),
            minWidth: 140,
          },
          { key: 'use', head: t('factorBook.use'), cell: ({ use }) => names.use(use), minWidth: 120 },
          {
            key: 'sum',
            head: t('factorBook.sum'),
            cell: ({ totalKgPerM2 }) => count(totalKgPerM2),
            sortBy: ({ totalKgPerM2 }) => totalKgPerM2,
            align: 'right',
          },
          {
            key: 'band',
            head: t('factorBook.band'),
            cell: ({ band }) => formatRange(band.p10KgPerM2, band.p90KgPerM2, count),
            align: 'right',
            minWidth: 130,
          },
          {
            key: 'verdict',
            head: t('factorBook.verdict'),
            cell: ({ verdict }) => (
              <Badge
                tone={verdict === 'within' ? 'good' : 'attention'}
                label={t(`factorBook.bandVerdict.${verdict}`)}
              />
            ),
            minWidth: 130,
          },
        ]}
      />
    </Panel>
  )
}
