import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Progress } from '@/components/ui/Progress'
import { formatDate } from '@/shared/format'
import { useHandInState } from '@/sync/react/FieldProvider'
import { useSession } from '@/sync/react/SessionProvider'

/** How handing in goes, or why it stopped, what is safe and what to do. */
export function HandInStatus({ onSignIn }: { readonly onSignIn: () => void }) {
  const { t, locale } = useMessages()
  const { phase, done, total, stoppedBecause, nextTryAt } = useHandInState()
  const { mustSignInAgain } = useSession()
  if (phase === 'sending' || phase === 'fetching' || phase === 'sending-photos') {
    const share = total > 0 && phase !== 'fetching' ? done / total : null
    const note = total > 0 ? t('bag.progress', { done, total }) : undefined
    return <Progress label={t(`bag.phase.${phase}`)} share={share} note={note} />
  }
  const reason = mustSignInAgain ? 'sign-in-again' : stoppedBecause
  if (!reason) return null
  const next =
    nextTryAt && reason === 'no-network' ? t('bag.nextTry', { time: formatDate(nextTryAt, locale, 'time') }) : ''
  return (
    <Notice
      tone={reason === 'no-network' ? 'attention' : 'error'}
      whatHappened={t(`bag.stopped.${reason}`)}
      whatIsSafe={t('bag.safe')}
      whatToDo={[t(`bag.whatToDo.${reason}`), next].join(' ').trim()}
      action={reason === 'sign-in-again' ? <Button label={t('me.signInAgain')} onPress={onSignIn} /> : undefined}
    />
  )
}
