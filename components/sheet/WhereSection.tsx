import { useState } from 'react'
import { View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { formatDistance } from '@/shared/format'
import type { SectionProps } from './form.types'
import { UnconfirmedNote } from './UnconfirmedNote'

type Refusal = 'denied' | 'unavailable' | 'late'
/** By the code a browser gives. */
const REFUSALS: Readonly<Record<number, Refusal>> = { 1: 'denied', 2: 'unavailable', 3: 'late' }

const FINDINGS = ['standing', 'inaccessible', 'not-a-building', 'cleared'] as const

/** What was found at the place, and where the surveyor stood. */
export function WhereSection(props: SectionProps) {
  const { answers, faults, answer } = props
  const { t, locale } = useMessages()
  const [isLocating, setIsLocating] = useState(false)
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const { finding, position } = answers
  const takePosition = () => {
    if (!globalThis.navigator?.geolocation) return setRefusal('unavailable')
    setIsLocating(true)
    setRefusal(null)
    globalThis.navigator.geolocation.getCurrentPosition(
      ({ coords: { longitude, latitude, accuracy } }) => {
        setIsLocating(false)
        answer('position', { longitude, latitude, accuracyM: Math.min(100_000, accuracy) })
      },
      ({ code }) => {
        setIsLocating(false)
        setRefusal(REFUSALS[code] ?? 'unavailable')
      },
      { enableHighAccuracy: true, timeout: 20_000 },
    )
  }
  return (
    <Panel title={t('sheet.sections.where')}>
      <Choice
        label={t('sheet.finding')}
        value={finding?.kind ?? null}
        error={faults.finding}
        onChange={(kind) => answer('finding', kind === 'cleared' ? { kind, clearedYear: null } : { kind })}
        options={FINDINGS.map((value) => ({ value, label: t(`vocabulary.finding.${value}`) }))}
      />
      <UnconfirmedNote {...props} group="finding" />
      {finding?.kind === 'cleared' ? (
        <NumberField
          label={t('sheet.clearedYear')}
          hint={t('sheet.clearedYearHint')}
          whole
          grouping={false}
          value={finding.clearedYear}
          onChange={(clearedYear) => answer('finding', { kind: 'cleared', clearedYear })}
        />
      ) : null}
      <View>
        <AppText soft>
          {position
            ? t('sheet.positionNoted', { distance: formatDistance(position.accuracyM, locale) })
            : t('sheet.positionNone')}
        </AppText>
        {refusal ? <AppText tone="attention">{t(`sheet.positionRefused.${refusal}`)}</AppText> : null}
        <Button kind="quiet" icon="locate" label={t('sheet.positionTake')} busy={isLocating} onPress={takePosition} />
      </View>
    </Panel>
  )
}
