import { useQuery } from '@tanstack/react-query'
import { useLocalSearchParams, useRouter } from 'expo-router'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { Select } from '@/components/ui/Select'
import type { Round } from '@/shared/api/rounds'
import type { ChosenLookFigure } from '@/shared/schemas/nextLook'
import { useApi } from '@/sync/react/SessionProvider'
import { FigureChoice } from './FigureChoice'
import { LookList } from './LookList'
import { LookMap } from './LookMap'
import { nextLookQuery, lookRoundsQuery } from './nextLookQueries'
import { NowPanel } from './NowPanel'
import { PlanPanel } from './PlanPanel'

/** The plan of a round: which buildings make a chosen figure surest, how sure it becomes, and whose beat they are on. */
export function LookNextScreen() {
  const { t } = useMessages()
  const { round: wanted } = useLocalSearchParams<{ round?: string }>()
  const router = useRouter()
  const rounds = useQuery(lookRoundsQuery(useApi()))
  const round = rounds.data?.find(({ roundId }) => roundId === wanted) ?? rounds.data?.[0]
  return (
    <Screen
      title={t('nextLook.title')}
      subtitle={round ? `${round.districtName} · ${round.name}` : undefined}
      width="full"
    >
      <AppText soft>{t('nextLook.lead')}</AppText>
      {rounds.error ? <ProblemNotice error={rounds.error} onRetry={() => void rounds.refetch()} /> : null}
      {rounds.isPending ? <AppText soft>{t('common.loading')}</AppText> : null}
      {rounds.data && !round ? <EmptyState title={t('nextLook.noRound')} text={t('nextLook.noRoundText')} /> : null}
      {rounds.data && round ? (
        <>
          {rounds.data.length > 1 ? (
            <Select
              label={t('nextLook.round')}
              options={rounds.data.map(({ roundId, name, districtName }) => ({
                value: roundId,
                label: `${districtName} · ${name}`,
              }))}
              value={round.roundId}
              onChange={(roundId) => router.setParams({ round: roundId })}
            />
          ) : null}
          <RankedRound key={round.roundId} round={round} />
        </>
      ) : null}
    </Screen>
  )
}

function RankedRound({ round }: { readonly round: Round }) {
  const { t } = useMessages()
  const [figure, setFigure] = useState<ChosenLookFigure | null>(null)
  const read = useQuery({ ...nextLookQuery(useApi(), round.roundId, figure), placeholderData: (before) => before })
  const { data } = read
  if (!data) {
    return read.error ? (
      <ProblemNotice error={read.error} onRetry={() => void read.refetch()} />
    ) : (
      <AppText soft>{t('common.loading')}</AppText>
    )
  }
  return (
    <>
      <FigureChoice roundId={round.roundId} ranked={data} figure={figure ?? data.figure} onChange={setFigure} />
      {read.error ? <ProblemNotice error={read.error} onRetry={() => void read.refetch()} /> : null}
      <NowPanel ranked={data} />
      {data.looks.length === 0 ? (
        <Panel>
          <EmptyState title={t('nextLook.empty')} text={t('nextLook.emptyText')} />
        </Panel>
      ) : (
        <>
          <PlanPanel ranked={data} />
          <LookMap districtId={round.districtId} districtName={round.districtName} ranked={data} />
          <LookList ranked={data} fileName={`look-next-${round.name}.csv`} />
        </>
      )}
    </>
  )
}
