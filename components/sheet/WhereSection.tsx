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

const FINDINGS = ['standing', 'inaccessible', 'not-a-building', 'cleared'] as const

/** What was found at the place, and where the surveyor stood. */
export function WhereSection({ answers, faults, answer }: SectionProps) {
  const { t, locale } = useMessages()
  const [isLocating, setIsLocating] = useState(false)
  const { finding, position } = answers
  const takePosition = () => {
    if (!globalThis.navigator?.geolocation) return
    setIsLocating(true)
    globalThis.navigator.geolocation.getCurrentPosition(
      ({ coords: { longitude, latitude, accuracy } }) => {
        setIsLocating(false)
        answer('position', { longitude, latitude, accuracyM: Math.min(100_000, accuracy) })
      },
      () => setIsLocating(false),
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
        <Button kind="quiet" icon="locate" label={t('sheet.positionTake')} busy={isLocating} onPress={takePosition} />
      </View>
    </Panel>
  )
}
