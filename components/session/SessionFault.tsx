import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { ApiError } from '@/sync/api/ApiError'

/** Why signing in, joining or resetting did not work. */
export function SessionFault({ error }: { readonly error: unknown }) {
  const { t } = useMessages()
  if (error instanceof ApiError) {
    const faults = error.problem.faults.map(({ detail }) => detail).join(' ')
    return <Notice tone="error" urgent whatHappened={error.problem.detail} whatToDo={faults || undefined} />
  }
  return (
    <Notice
      tone="attention"
      urgent
      whatHappened={t('auth.noServer')}
      whatIsSafe={t('auth.keptIsSafe')}
      whatToDo={t('auth.tryWithNetwork')}
    />
  )
}
