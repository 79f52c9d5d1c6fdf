import { useQuery } from '@tanstack/react-query'
import { useRouter } from 'expo-router'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { RunTitleBlock } from '@/components/runs/RunTitleBlock'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Screen } from '@/components/ui/Screen'
import { printPage } from '@/components/ui/web/printPage'
import { webOnly } from '@/components/ui/web/webOnly'
import type { Receipt, ReceiptFigure } from '@/shared/schemas/receipt'
import { useApi } from '@/sync/react/SessionProvider'
import { BuildingParts } from './BuildingParts'
import { FigurePanel } from './FigurePanel'
import { figureOfAddress, type Address } from './figureOfAddress'
import { GroupParts } from './GroupParts'
import { receiptHref } from './receiptHref'
import { receiptQuery } from './receiptQueries'
import { FactorSources, LifetimeSources } from './ReceiptSources'
import { TermParts } from './TermParts'

/** The page behind a figure: its parts, the rows and sources they rest on, and the formula with the numbers in it. */
export function ReceiptScreen({ address }: { readonly address: Address }) {
  const { t } = useMessages()
  const named = figureOfAddress(address)
  if (!named) {
    return (
      <Screen title={t('receipts.title')}>
        <EmptyState title={t('receipts.noRun')} text={t('receipts.noRunText')} />
      </Screen>
    )
  }
  return <LoadedReceipt {...named} />
}

function LoadedReceipt({ runId, figure }: { readonly runId: string; readonly figure: ReceiptFigure }) {
  const { t } = useMessages()
  const router = useRouter()
  const read = useQuery(receiptQuery(useApi(), runId, figure))
  const { kind, material, fromYear, toYear } = figure
  const isPart = [figure.use, figure.structure, figure.period, figure.buildingId].some((part) => part !== null)
  const whole = receiptHref({ runId, kind, material, fromYear, toYear })
  const { data } = read
  return (
    <Screen
      title={t('receipts.title')}
      subtitle={data ? `${data.run.districtName} · ${data.run.roundName}` : undefined}
      width="report"
      right={
        printPage ? (
          <View {...webOnly({ dataSet: { printHide: '' } })}>
            <Button kind="secondary" label={t('receipts.print')} onPress={printPage} />
          </View>
        ) : undefined
      }
    >
      {isPart ? (
        <View style={styles.up} {...webOnly({ dataSet: { printHide: '' } })}>
          <Button
            kind="quiet"
            icon="back"
            label={t('receipts.upToAll')}
            href={whole}
            onPress={() => router.push(whole)}
          />
        </View>
      ) : null}
      {read.error ? <ProblemNotice error={read.error} onRetry={() => void read.refetch()} /> : null}
      {data ? <Parts receipt={data} /> : read.error ? null : <AppText soft>{t('common.loading')}</AppText>}
      {data ? <RunTitleBlock run={data.run} /> : null}
    </Screen>
  )
}

function Parts({ receipt }: { readonly receipt: Receipt }) {
  const { t } = useMessages()
  const { groups, buildings } = receipt
  if (groups.length === 0) return <EmptyState title={t('receipts.nothing')} text={t('receipts.nothingText')} />
  return (
    <>
      <FigurePanel receipt={receipt} />
      {groups.length > 1 ? <GroupParts receipt={receipt} /> : null}
      {buildings.length > 0 ? <BuildingParts receipt={receipt} /> : null}
      <TermParts receipt={receipt} />
      <FactorSources receipt={receipt} />
      {receipt.lifetimes.length > 0 ? <LifetimeSources receipt={receipt} /> : null}
    </>
  )
}

const styles = StyleSheet.create({ up: { alignItems: 'flex-start' } })
