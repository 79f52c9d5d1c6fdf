import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { useChosenRun } from '@/components/runs/useChosenRun'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { Button } from '@/components/ui/Button'
import { DataTable } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { formatDate, formatMass } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { ListBuildingDialog } from './ListBuildingDialog'
import { listingsQuery, type ListedSide } from './listedQueries'

interface ListedScreenProps {
  readonly side: ListedSide
  readonly onOpen: (listingId: string) => void
}

/** Buildings with a known day of demolition: those listed by the desk, or those listed to me. */
export function ListedScreen({ side, onOpen }: ListedScreenProps) {
  const { t, locale } = useMessages()
  const listings = useQuery(listingsQuery(useApi(), side))
  return (
    <Screen title={t('nav.listed')}>
      <AppText>{t(side === 'desk' ? 'listed.leadDesk' : 'listed.leadYard')}</AppText>
      {side === 'desk' ? <ListOne onOpen={onOpen} /> : null}
      {listings.error ? <ProblemNotice error={listings.error} onRetry={() => void listings.refetch()} /> : null}
      {listings.isPending ? <AppText soft>{t('common.loading')}</AppText> : null}
      {listings.data ? (
        <Panel title={t('listed.list')}>
          <DataTable
            label={t('listed.list')}
            rows={listings.data}
            rowKey={({ listingId }) => listingId}
            onPressRow={({ listingId }) => onOpen(listingId)}
            rowLabel={({ label }) => t('listed.openOf', { label })}
            empty={
              <EmptyState
                title={t('listed.empty')}
                text={t(side === 'desk' ? 'listed.emptyDesk' : 'listed.emptyYard')}
              />
            }
            columns={[
              {
                key: 'label',
                head: t('listed.building'),
                cell: ({ label }) => label,
                sortBy: ({ label }) => label,
                weight: 3,
                minWidth: 160,
              },
              {
                key: 'day',
                head: t('listed.comesDownOn'),
                cell: ({ comesDownOn }) => formatDate(comesDownOn, locale),
                sortBy: ({ comesDownOn }) => comesDownOn,
                weight: 2,
                minWidth: 130,
              },
              {
                key: 'mass',
                head: t('common.mass'),
                cell: ({ massKg }) => formatMass(massKg, locale),
                sortBy: ({ massKg }) => massKg,
                align: 'right',
              },
              {
                key: 'district',
                head: t('nav.district'),
                cell: ({ districtName }) => districtName,
                weight: 2,
                minWidth: 110,
              },
              {
                key: 'readers',
                head: t('listed.readers'),
                cell: ({ recipients }) => recipients.map(({ name, firm }) => firm ?? name).join(', '),
                weight: 2,
                minWidth: 140,
              },
              {
                key: 'state',
                head: t('listed.state'),
                cell: ({ withdrawalReason }) =>
                  withdrawalReason === null ? (
                    <Badge tone="good" label={t('listed.open')} />
                  ) : (
                    t('listed.withdrawn', { reason: withdrawalReason })
                  ),
                weight: 2,
                minWidth: 140,
              },
            ]}
          />
        </Panel>
      ) : null}
    </Screen>
  )
}

function ListOne({ onOpen }: { readonly onOpen: (listingId: string) => void }) {
  const { t } = useMessages()
  const runs = useChosenRun()
  const [isAsking, setAsking] = useState(false)
  if (runs.isLoading) return null
  if (runs.finished.length === 0) return <Notice tone="attention" whatHappened={t('publish.noRun')} />
  return (
    <>
      <View style={styles.act}>
        <Button kind="primary" label={t('listed.listOne')} onPress={() => setAsking(true)} />
      </View>
      {isAsking ? (
        <ListBuildingDialog finished={runs.finished} onClose={() => setAsking(false)} onListed={onOpen} />
      ) : null}
    </>
  )
}

const styles = StyleSheet.create({ act: { flexDirection: 'row' } })
