import { useState } from 'react'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { TextField } from '@/components/ui/TextField'
import { formatDate } from '@/shared/format'
import { useWalk } from './useWalk'
import { ASK_EVERY_MINUTES, type Walk } from './walk'

const NEVER = 'never'
type WalkPlanned = Pick<Walk, 'askEveryMinutes' | 'callName' | 'callNumber'>

/** Start and end of a walk, how often the phone asks whether all is well, and whom to call. */
export function WalkPanel() {
  const { t, locale } = useMessages()
  const { walk, end } = useWalk()
  const [isOpen, setIsOpen] = useState(false)
  if (!walk) {
    return (
      <Panel title={t('today.walk.title')}>
        <AppText soft>{t('cautions.loneWorker')}</AppText>
        {isOpen ? (
          <WalkPlan onStarted={() => setIsOpen(false)} />
        ) : (
          <Button kind="secondary" label={t('today.walk.plan')} onPress={() => setIsOpen(true)} />
        )}
      </Panel>
    )
  }
  const time = formatDate(new Date(walk.startedAtMs).toISOString(), locale, 'time')
  return (
    <Panel title={t('today.walk.title')} note={t('today.walk.since', { time })}>
      <AppText>
        {walk.askEveryMinutes === null
          ? t('today.walk.notAsked')
          : t('today.walk.asked', { minutes: walk.askEveryMinutes })}
      </AppText>
      <Button kind="secondary" label={t('today.walk.end')} onPress={end} />
    </Panel>
  )
}

function WalkPlan({ onStarted }: { readonly onStarted: () => void }) {
  const { t } = useMessages()
  const { start, last } = useWalk()
  const [plan, setPlan] = useState<WalkPlanned>(() => last() ?? { askEveryMinutes: 30, callName: '', callNumber: '' })
  const begin = () => {
    const { askEveryMinutes, callName, callNumber } = plan
    start({ askEveryMinutes, callName: callName.trim(), callNumber: callNumber.trim() }, new Date().getTime())
    onStarted()
  }
  return (
    <>
      <Choice
        label={t('today.walk.askEvery')}
        hint={t('today.walk.staysHere')}
        value={String(plan.askEveryMinutes ?? NEVER)}
        onChange={(value) => setPlan({ ...plan, askEveryMinutes: value === NEVER ? null : Number(value) })}
        options={[
          ...ASK_EVERY_MINUTES.map((minutes) => ({
            value: String(minutes),
            label: t('today.walk.minutes', { minutes }),
          })),
          { value: NEVER, label: t('today.walk.never') },
        ]}
      />
      <TextField
        label={t('today.walk.callName')}
        maxLength={80}
        value={plan.callName}
        onChange={(callName) => setPlan({ ...plan, callName })}
      />
      <TextField
        label={t('today.walk.callNumber')}
        maxLength={40}
        keyboard="phone-pad"
        value={plan.callNumber}
        onChange={(callNumber) => setPlan({ ...plan, callNumber })}
      />
      <Button kind="primary" label={t('today.walk.start')} onPress={begin} />
    </>
  )
}
