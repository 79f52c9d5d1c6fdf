import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { formatDate } from '@/shared/format'
import { useIsAsked, useWalk } from './useWalk'
import { dialable } from './walk'

/** Asks "All well?" when the time of a walk is up, and shows whom to call. */
export function AllWellDialog() {
  const { t, locale } = useMessages()
  const { walk, allWell } = useWalk()
  const isAsked = useIsAsked(walk)
  if (!walk || !isAsked) return null
  const number = dialable(walk.callNumber)
  const well = () => allWell(new Date().getTime())
  return (
    <Dialog
      isOpen
      tone="attention"
      title={t('today.walk.allWell')}
      onClose={well}
      actions={<Button kind="primary" grow label={t('today.walk.yesAllWell')} onPress={well} />}
    >
      <AppText>
        {t('today.walk.lastWell', { time: formatDate(new Date(walk.lastWellAtMs).toISOString(), locale, 'time') })}
      </AppText>
      <AppText weight="semibold">
        {walk.callName || walk.callNumber
          ? t('today.walk.ifNot', { who: [walk.callName, walk.callNumber].filter(Boolean).join(', ') })
          : t('today.walk.ifNotNobody')}
      </AppText>
      {number ? <Button href={`tel:${number}`} label={t('today.walk.call', { number: walk.callNumber })} /> : null}
    </Dialog>
  )
}
