import { useQuery } from '@tanstack/react-query'
import { useRouter } from 'expo-router'
import { View } from 'react-native'
import { MaterialName } from '@/components/runs/MaterialName'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { DataTable } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { printPage } from '@/components/ui/web/printPage'
import { webOnly } from '@/components/ui/web/webOnly'
import type { LoadReceipt } from '@/shared/api/receipts'
import { formatCount, formatDecimal, formatMass } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import type { Address } from './figureOfAddress'
import { loadReceiptQuery, type LoadFigure } from './receiptQueries'
import { sourceColumns } from './ReceiptSources'

/** How one line of the loads ahead comes about, at the grain at which it was published. */
export function LoadReceiptScreen({ address }: { readonly address: Address }) {
  const { t } = useMessages()
  const publicationId = textOf(address, 'publication')
  const figure: LoadFigure = {
    code: textOf(address, 'code') ?? '',
    year: Number(textOf(address, 'year')),
    containerM3: Number(textOf(address, 'container') ?? 30),
    payloadT: Number(textOf(address, 'payload') ?? 13),
  }
  if (publicationId === null) {
    return (
      <Screen title={t('receipts.title')}>
        <EmptyState title={t('receipts.noRun')} text={t('receipts.noRunText')} />
      </Screen>
    )
  }
  return <LoadedLoadReceipt publicationId={publicationId} figure={figure} />
}

function textOf(address: Address, name: string): string | null {
  const value = address[name]
  return typeof value === 'string' && value !== '' ? value : null
}

function LoadedLoadReceipt({ publicationId, figure }: { readonly publicationId: string; readonly figure: LoadFigure }) {
  const { t } = useMessages()
  const router = useRouter()
  const read = useQuery(loadReceiptQuery(useApi(), publicationId, figure))
  const { data } = read
  return (
    <Screen
      title={t('receipts.title')}
      subtitle={data ? `${data.publication.title} · ${data.publication.districtName}` : undefined}
      onBack={() => router.navigate(`/loads-ahead/${publicationId}`)}
      right={
        printPage ? (
          <View {...webOnly({ dataSet: { printHide: '' } })}>
            <Button kind="secondary" label={t('receipts.print')} onPress={printPage} />
          </View>
        ) : undefined
      }
    >
      {read.error ? <ProblemNotice error={read.error} onRetry={() => void read.refetch()} /> : null}
      {data ? <LoadParts receipt={data} /> : read.error ? null : <AppText soft>{t('common.loading')}</AppText>}
    </Screen>
  )
}

function LoadParts({ receipt }: { readonly receipt: LoadReceipt }) {
  const messages = useMessages()
  const { t, locale } = messages
  const { line, fleet, parts, densities, sources } = receipt
  const count = (value: number): string => formatCount(value, locale)
  const span = ({ low, likely, high }: LoadReceipt['line']['massKg'], write: (value: number) => string): string =>
    t('receipts.likely', { low: write(low), likely: write(likely), high: write(high) })
  const tonnes = (massKg: number): string => formatDecimal(massKg / 1_000, locale, 2)
  const cubic = (volumeM3: number): string => formatDecimal(volumeM3, locale, 2)
  return (
    <>
      <Panel title={t('receipts.load', { code: line.code, text: line.text, year: String(line.year) })} tone="selection">
        <AppText kind="figure" size="figure">
          {formatMass(line.massKg.likely, locale)}
        </AppText>
        <AppText>
          {t('receipts.loadFormula', {
            mass: count(line.massKg.likely),
            volume: cubic(line.looseVolumeM3.likely),
            container: formatDecimal(fleet.containerM3, locale, 1),
            payload: count(fleet.payloadT * 1_000),
            loads: count(line.loads.likely),
          })}
        </AppText>
        <AppText soft>{t('receipts.loadGrain')}</AppText>
        <AppText soft>{t('receipts.probabilistic')}</AppText>
      </Panel>
      <Panel title={t('receipts.loadParts')} note={t('receipts.loadPartsNote')}>
        <DataTable
          label={t('receipts.loadParts')}
          rows={parts}
          rowKey={({ material, flow }) => `${material}/${flow}`}
          columns={[
            {
              key: 'material',
              head: t('common.material'),
              cell: ({ material }) => <MaterialName material={material} />,
              minWidth: 140,
            },
            {
              key: 'flow',
              head: t('receipts.flow'),
              cell: ({ flow }) => t(flow === 'demolition' ? 'receipts.flowDemolition' : 'receipts.flowRefurbishment'),
              minWidth: 120,
            },
            {
              key: 'mass',
              head: t('receipts.massRange'),
              cell: ({ massKg }) => span(massKg, tonnes),
              align: 'right',
              weight: 2,
              minWidth: 200,
            },
            {
              key: 'density',
              head: t('receipts.density'),
              cell: ({ densityKgPerM3 }) => span(densityKgPerM3, count),
              align: 'right',
              weight: 2,
              minWidth: 200,
            },
            {
              key: 'volume',
              head: t('receipts.volumeRange'),
              cell: ({ looseVolumeM3 }) => span(looseVolumeM3, cubic),
              align: 'right',
              weight: 2,
              minWidth: 200,
            },
          ]}
          totals={{
            material: t('common.total'),
            mass: span(line.massKg, tonnes),
            volume: span(line.looseVolumeM3, cubic),
          }}
        />
      </Panel>
      <Panel title={t('receipts.densitySources')}>
        <DataTable
          label={t('receipts.densitySources')}
          rows={densities}
          rowKey={({ material }) => material}
          columns={[
            {
              key: 'material',
              head: t('common.material'),
              cell: ({ material }) => <MaterialName material={material} />,
              minWidth: 140,
            },
            ...sourceColumns<LoadReceipt['densities'][number]>(messages),
          ]}
        />
      </Panel>
      <Panel title={t('receipts.contentSources')}>
        <DataTable
          label={t('receipts.contentSources')}
          rows={sources}
          rowKey={({ source }) => source}
          columns={[
            {
              key: 'materials',
              head: t('common.material'),
              cell: ({ materials }) => materials.map((material) => t(`vocabulary.material.${material}`)).join(', '),
              minWidth: 160,
            },
            ...sourceColumns<LoadReceipt['sources'][number]>(messages),
          ]}
        />
      </Panel>
    </>
  )
}
