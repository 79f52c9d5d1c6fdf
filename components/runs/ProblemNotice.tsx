import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { ApiError, UnreachableError } from '@/sync/api/ApiError'

interface ProblemNoticeProps {
  readonly error: Error
  readonly onRetry?: () => void
  /** Something was sent: an answer that did not come leaves open whether it arrived. */
  readonly isSending?: boolean
}

/** What went wrong with a request, in the server's own words where it has some. */
export function ProblemNotice({ error, onRetry, isSending = false }: ProblemNoticeProps) {
  const { t } = useMessages()
  const action = onRetry ? <Button label={t('common.tryAgain')} onPress={onRetry} /> : undefined
  if (error instanceof ApiError) {
    const faults = error.problem.faults.map(({ detail }) => detail).join(' ')
    return <Notice urgent whatHappened={error.problem.detail} whatToDo={faults || undefined} action={action} />
  }
  if (error instanceof UnreachableError) {
    return (
      <Notice
        urgent
        tone="attention"
        whatHappened={t('runs.unreachable')}
        whatIsSafe={t(isSending ? 'runs.unreachableSent' : 'runs.unreachableSafe')}
        whatToDo={t('runs.unreachableDo')}
        action={action}
      />
    )
  }
  return <Notice urgent whatHappened={t('runs.unexpected')} whatToDo={t('runs.unexpectedDo')} action={action} />
}
