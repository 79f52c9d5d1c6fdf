import { useQuery } from '@tanstack/react-query'
import { useRouter, type Href } from 'expo-router'
import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { Button } from '@/components/ui/Button'
import { DataTable } from '@/components/ui/DataTable'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Progress } from '@/components/ui/Progress'
import { Screen } from '@/components/ui/Screen'
import { SPACE } from '@/components/ui/theme/tokens'
import { formatCount, formatDate, formatShare } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { NewRoundDialog } from './NewRoundDialog'
import { districtsQuery, roundsQuery } from './roundQueries'

/** All rounds with how far they came, and the two ways to begin: outlines, then a round over them. */
export function RoundsScreen() {
  const { t } = useMessages()
  return (
    <Screen title={t('nav.rounds')} subtitle={t('rounds.subtitle')} width="report">
      <DistrictsPanel />
      <RoundsPanel />
    </Screen>
  )
}

function DistrictsPanel() {
  const { t, locale } = useMessages()
  const api = useApi()
  const router = useRouter()
  const districts = useQuery(districtsQuery(api))
  const hasDistrict = (districts.data?.districts.length ?? 0) > 0
  return (
    <Panel
      title={t('rounds.districts')}
      action={
        <View style={styles.row}>
          {hasDistrict ? (
            <Button
              kind="quiet"
              label={t('rounds.drawDistrict')}
              onPress={() => router.navigate('/rounds/draw' as Href)}
            />
          ) : null}
          <Button
            label={t('rounds.importOutlines')}
            kind={hasDistrict ? 'secondary' : 'primary'}
            onPress={() => router.navigate('/rounds/import' as Href)}
          />
        </View>
      }
    >
      {districts.error ? <ProblemNotice error={districts.error} onRetry={() => void districts.refetch()} /> : null}
      {districts.data && !hasDistrict ? (
        <EmptyState title={t('rounds.noDistrict')} text={t('rounds.noDistrictText')} />
      ) : null}
      {hasDistrict ? (
        <DataTable
          label={t('rounds.districts')}
          rows={districts.data?.districts ?? []}
          rowKey={(district) => district.districtId}
          columns={[
            { key: 'name', head: t('rounds.district'), cell: (district) => district.name },
            {
              key: 'outlines',
              head: t('rounds.outlines'),
              align: 'right',
              cell: (district) => formatCount(district.outlineCount, locale),
            },
            {
              key: 'blocks',
              head: t('rounds.blocks'),
              align: 'right',
              cell: (district) => formatCount(district.blockCount, locale),
            },
          ]}
        />
      ) : null}
    </Panel>
  )
}

function RoundsPanel() {
  const { t, locale } = useMessages()
  const api = useApi()
  const router = useRouter()
  const rounds = useQuery(roundsQuery(api))
  const districts = useQuery(districtsQuery(api))
  const [isMaking, setMaking] = useState(false)
  const hasDistrict = (districts.data?.districts.length ?? 0) > 0
  return (
    <>
      <Panel
        title={t('rounds.all')}
        action={hasDistrict ? <Button label={t('rounds.newRound')} onPress={() => setMaking(true)} /> : undefined}
      >
        {rounds.isPending ? <Progress label={t('common.loading')} share={null} /> : null}
        {rounds.error ? <ProblemNotice error={rounds.error} onRetry={() => void rounds.refetch()} /> : null}
        {rounds.data?.rounds.length === 0 ? (
          <EmptyState title={t('rounds.noRound')} text={t('rounds.noRoundText')} />
        ) : null}
        {rounds.data && rounds.data.rounds.length > 0 ? (
          <DataTable
            label={t('rounds.all')}
            rows={rounds.data.rounds}
            rowKey={(round) => round.roundId}
            rowLabel={(round) => t('rounds.openRound', { name: round.name })}
            onPressRow={(round) => router.navigate(`/rounds/${round.roundId}` as Href)}
            columns={[
              { key: 'name', head: t('rounds.round'), cell: (round) => round.name },
              {
                key: 'dates',
                head: t('rounds.dates'),
                cell: (round) => `${formatDate(round.startsOn, locale)} – ${formatDate(round.endsOn, locale)}`,
              },
              {
                key: 'buildings',
                head: t('rounds.buildings'),
                align: 'right',
                cell: (round) => formatCount(round.coverage.buildingCount, locale),
              },
              {
                key: 'waiting',
                head: t('rounds.handedIn'),
                align: 'right',
                cell: (round) => formatCount(round.coverage.handedInCount, locale),
              },
              {
                key: 'checked',
                head: t('rounds.checked'),
                align: 'right',
                cell: (round) => formatCount(round.coverage.checkedCount, locale),
              },
              {
                key: 'area',
                head: t('rounds.byFootprint'),
                align: 'right',
                cell: (round) => formatShare(round.footprintShareRecorded, locale),
              },
            ]}
          />
        ) : null}
      </Panel>
      {isMaking ? (
        <NewRoundDialog districts={districts.data?.districts ?? []} onClose={() => setMaking(false)} />
      ) : null}
    </>
  )
}

const styles = StyleSheet.create({ row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small } })
