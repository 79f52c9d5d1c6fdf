import { useEffect, useState, useSyncExternalStore } from 'react'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { handInBusy } from '@/sync/react/handInBusy'

/** Says that a newer app waits; it changes over when the person says so, never under a form or a bag on its way. */
export function UpdateNotice() {
  const { t } = useMessages()
  const [changeOver, setChangeOver] = useState<(() => void) | null>(null)
  useEffect(() => {
    const hear = (event: Event) => {
      const { detail } = event as CustomEvent<unknown>
      if (typeof detail === 'function') setChangeOver(() => () => void detail())
    }
    globalThis.addEventListener?.('tallystone-update', hear)
    return () => globalThis.removeEventListener?.('tallystone-update', hear)
  }, [])
  const isBusy = useSyncExternalStore(handInBusy.subscribe, handInBusy.get, handInBusy.get)
  if (!changeOver || isBusy) return null
  return (
    <Notice
      tone="selection"
      whatHappened={t('auth.updateReady')}
      whatIsSafe={t('auth.updateSafe')}
      action={<Button label={t('auth.updateNow')} onPress={changeOver} />}
    />
  )
}
