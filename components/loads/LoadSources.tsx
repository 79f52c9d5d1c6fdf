import { MaterialName } from '@/components/runs/MaterialName'
import { AppText } from '@/components/ui/AppText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import type { LoadsAhead } from '@/shared/api/publications'
import { PROVENANCES } from '@/shared/compute/factors/vocabulary'
import { formatCount, formatMass, formatRange } from '@/shared/format'

/** Masses without a code, and the bulk densities with their sources. */
export function LoadSources({ loads }: { readonly loads: LoadsAhead }) {
  const { t, locale } = useMessages()
  const provenanceText = (word: string): string => {
    const known = PROVENANCES.find((provenance) => provenance === word)
    return known ? t(`vocabulary.provenance.${known}`) : word
  }
  return (
    <>
      {loads.unassigned.length > 0 ? (
        <Panel title={t('loads.unassigned')} tone="attention">
          <AppText>{t('loads.unassignedText')}</AppText>
          <DataTable
            label={t('loads.unassigned')}
            rows={loads.unassigned}
            rowKey={({ material }) => material}
            columns={[
              {
                key: 'material',
                head: t('common.material'),
                cell: ({ material }) => <MaterialName material={material} />,
                weight: 2,
              },
              {
                key: 'mass',
                head: t('common.mass'),
                cell: ({ massKg }) => formatMass(massKg, locale),
                align: 'right',
              },
            ]}
          />
        </Panel>
      ) : null}
      <Panel title={t('loads.densities')}>
        <DataTable
          label={t('loads.densities')}
          rows={loads.densities}
          rowKey={({ code, lowKgPerM3, highKgPerM3, source }) => `${code}/${lowKgPerM3}/${highKgPerM3}/${source}`}
          columns={[
            { key: 'code', head: t('loads.code'), cell: ({ code }) => code, minWidth: 92 },
            {
              key: 'density',
              head: t('loads.density'),
              cell: ({ lowKgPerM3, highKgPerM3 }) =>
                formatRange(lowKgPerM3, highKgPerM3, (value) => formatCount(value, locale)),
              align: 'right',
              minWidth: 120,
            },
            { key: 'source', head: t('loads.source'), cell: ({ source }) => source, weight: 3, minWidth: 200 },
            {
              key: 'provenance',
              head: t('loads.provenance'),
              cell: ({ provenance }) => provenanceText(provenance),
              minWidth: 120,
            },
          ]}
        />
      </Panel>
    </>
  )
}
