import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useRouter, type Href } from 'expo-router'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { Button } from '@/components/ui/Button'
import { Choice } from '@/components/ui/Choice'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Progress } from '@/components/ui/Progress'
import { Screen } from '@/components/ui/Screen'
import { Select } from '@/components/ui/Select'
import { useToast } from '@/components/ui/Toast'
import { checkSheets } from '@/shared/api/review'
import { formatCount } from '@/shared/format'
import { SHEET_STATES, type SheetState } from '@/shared/schemas/sheet'
import { useApi } from '@/sync/react/SessionProvider'
import { QueueTable } from './QueueTable'
import { queueQuery, reviewKeys, reviewRoundsQuery } from './reviewQueries'

const EVERY_ROUND = ' '

/** What came in, flags first: open one, or accept those without a flag together. */
export function ReviewScreen() {
  const { t, locale } = useMessages()
  const api = useApi()
  const router = useRouter()
  const [roundId, setRoundId] = useState<string>(EVERY_ROUND)
  const [state, setState] = useState<SheetState>('handed-in')
  const rounds = useQuery(reviewRoundsQuery(api))
  const queue = useQuery(queueQuery(api, { roundId: roundId === EVERY_ROUND ? null : roundId, state }))
  const counts = queue.data?.counts
  const stateLabel = { 'handed-in': counts?.handedIn, checked: counts?.checked, 'sent-back': counts?.sentBack }
  return (
    <Screen title={t('nav.review')} subtitle={t('review.subtitle')} width="report">
      <Panel title={t('review.which')}>
        <Select
          label={t('review.round')}
          value={roundId}
          onChange={setRoundId}
          options={[
            { value: EVERY_ROUND, label: t('review.everyRound') },
            ...(rounds.data?.rounds ?? []).map((round) => ({ value: round.roundId, label: round.name })),
          ]}
        />
        <Choice
          label={t('review.state')}
          layout="segments"
          value={state}
          onChange={setState}
          options={SHEET_STATES.map((value) => ({
            value,
            label: `${t(`vocabulary.state.${value}`)} · ${formatCount(stateLabel[value] ?? 0, locale)}`,
          }))}
        />
      </Panel>
      <Panel title={t('review.queue')}>
        {queue.isPending ? <Progress label={t('common.loading')} share={null} /> : null}
        {queue.error ? <ProblemNotice error={queue.error} onRetry={() => void queue.refetch()} /> : null}
        {queue.data?.sheets.length === 0 ? <EmptyState title={t('review.empty')} text={t('review.emptyText')} /> : null}
        {queue.data && queue.data.sheets.length > 0 ? (
          <>
            <QueueTable
              sheets={queue.data.sheets}
              onOpen={(sheetId) => router.navigate(`/review/${sheetId}` as Href)}
            />
            {state === 'handed-in' ? <AcceptPlain sheets={queue.data.sheets} /> : null}
          </>
        ) : null}
      </Panel>
    </Screen>
  )
}

interface AcceptPlainProps {
  readonly sheets: readonly { readonly sheetId: string; readonly change: number; readonly flags: readonly string[] }[]
}

/** Accepts every sheet of the list that has no flag, as it was seen here. */
function AcceptPlain({ sheets }: AcceptPlainProps) {
  const { t } = useMessages()
  const api = useApi()
  const toast = useToast()
  const queries = useQueryClient()
  const plain = sheets.filter(({ flags }) => flags.length === 0)
  const accept = useMutation({
    mutationFn: () =>
      api.call(checkSheets, { body: { sheets: plain.map(({ sheetId, change }) => ({ sheetId, change })) } }),
    onSuccess: async ({ checkedIds }) => {
      toast(t('review.accepted', { count: checkedIds.length }), 'good')
      await queries.invalidateQueries({ queryKey: reviewKeys.all })
    },
  })
  if (plain.length === 0) return null
  return (
    <>
      {accept.error ? <ProblemNotice error={accept.error} isSending /> : null}
      <Button
        kind="secondary"
        label={t('review.acceptPlain', { count: plain.length })}
        onPress={() => accept.mutate()}
        busy={accept.isPending}
      />
    </>
  )
}
