import { useState } from 'react'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'

let wasRead = false

/** Reminder at the start of a walk, until it was read in this opening of the app. */
export function WalkCaution() {
  const { t } = useMessages()
  const [isOpen, setIsOpen] = useState(!wasRead)
  if (!isOpen) return null
  return (
    <Notice
      tone="attention"
      whatHappened={t('cautions.stayOutside')}
      whatToDo={t('cautions.loneWorker')}
      action={
        <Button
          kind="secondary"
          label={t('street.walkStart')}
          onPress={() => {
            wasRead = true
            setIsOpen(false)
          }}
        />
      }
    />
  )
}
