import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Screen } from '@/components/ui/Screen'

interface FieldFaultProps {
  readonly error: Error
  readonly retry: () => Promise<void>
}

/** In place of a screen that cannot be shown: a database that cannot be read must not look like an empty one. */
export function FieldFault({ error, retry }: FieldFaultProps) {
  const { t } = useMessages()
  return (
    <Screen title={t('nav.field')} width="form">
      <Notice
        tone="error"
        urgent
        whatHappened={t('bag.unreadable')}
        whatIsSafe={t('bag.unreadableSafe')}
        whatToDo={`${t('bag.unreadableToDo')} (${error.message})`}
        action={<Button label={t('bag.readAgain')} onPress={() => void retry()} />}
      />
    </Screen>
  )
}
