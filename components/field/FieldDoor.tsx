import type { ReactNode } from 'react'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Progress } from '@/components/ui/Progress'
import { Screen } from '@/components/ui/Screen'
import { useFieldOpening } from '@/sync/react/FieldProvider'
import { AllWellDialog } from './AllWellDialog'

/** Shows the field once the device's database is open; until then, or if it cannot be, says why. */
export function FieldDoor({ children }: { readonly children: ReactNode }) {
  const { t } = useMessages()
  const context = useFieldOpening()
  const opening = context?.opening ?? { kind: 'opening' as const }
  if (opening.kind === 'open') {
    return (
      <>
        {children}
        <AllWellDialog />
      </>
    )
  }
  return (
    <Screen title={t('nav.field')} width="form">
      {opening.kind === 'opening' ? <Progress label={t('me.opening')} share={null} /> : null}
      {opening.kind === 'elsewhere' ? (
        <Notice
          tone="attention"
          whatHappened={t('me.elsewhere')}
          whatIsSafe={t('me.elsewhereSafe')}
          whatToDo={t('me.elsewhereToDo')}
          action={<Button label={t('me.useHere')} onPress={() => context?.useHere()} />}
        />
      ) : null}
      {opening.kind === 'failed' ? (
        <Notice
          tone="error"
          urgent
          whatHappened={t('me.failed', { reason: opening.reason })}
          whatIsSafe={t('me.failedSafe')}
          whatToDo={t('me.failedToDo')}
          action={<Button label={t('common.tryAgain')} onPress={() => context?.useHere()} />}
        />
      ) : null}
    </Screen>
  )
}
