import { useQuery } from '@tanstack/react-query'
import { useEffect, useRef } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Progress } from '@/components/ui/Progress'
import { SPACE } from '@/components/ui/theme/tokens'
import { formatShare } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { ProblemNotice } from './ProblemNotice'
import { runQuery } from './runQueries'

interface NewRunProgressProps {
  readonly runId: string
  readonly onDone: (runId: string, number: number) => void
}

/** How far a started run has come, until it is done or the reason why it is not. */
export function NewRunProgress({ runId, onDone }: NewRunProgressProps) {
  const { t, locale } = useMessages()
  const run = useQuery(runQuery(useApi(), runId))
  const { state, progressShare = 0, failure, number = 0 } = run.data ?? {}
  const tell = useRef(onDone)
  useEffect(() => {
    tell.current = onDone
  })
  useEffect(() => {
    if (state === 'done') tell.current(runId, number)
  }, [state, runId, number])

  if (state === 'failed') {
    return (
      <Notice
        urgent
        whatHappened={`${t('runs.failedTitle')} ${failure ?? ''}`.trim()}
        whatIsSafe={t('runs.failedSafe')}
        whatToDo={t('runs.failedDo')}
      />
    )
  }
  if (state === 'cancelled') {
    return <Notice tone="attention" whatHappened={t('runs.cancelledTitle')} whatIsSafe={t('runs.failedSafe')} />
  }
  return (
    <View style={styles.stack}>
      {run.error ? <ProblemNotice error={run.error} onRetry={() => void run.refetch()} /> : null}
      <Progress
        label={t(`runs.state.${state ?? 'queued'}`)}
        share={state === 'running' ? progressShare : null}
        note={state === 'running' ? formatShare(progressShare, locale) : undefined}
      />
      <AppText soft>{t('runs.leaveOpen')}</AppText>
    </View>
  )
}

const styles = StyleSheet.create({ stack: { gap: SPACE.medium } })
