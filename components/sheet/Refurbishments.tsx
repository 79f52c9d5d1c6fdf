import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { IconButton } from '@/components/ui/IconButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Select } from '@/components/ui/Select'
import { SPACE } from '@/components/ui/theme/tokens'
import { COMPONENTS } from '@/shared/compute/factors/vocabulary'
import { MOST_REFURBISHMENTS, type ConstructionYear, type Refurbishment } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'

/** What was renewed, by component and year; a year left empty is not known. */
export function Refurbishments({ answers, faults, answer }: SectionProps) {
  const { t } = useMessages()
  const done = answers.refurbishments?.done ?? []
  const set = (next: readonly Refurbishment[]) => answer('refurbishments', { done: [...next] })
  const replace = (place: number, part: Partial<Refurbishment>) =>
    set(done.map((one, at) => (at === place ? { ...one, ...part } : one)))
  return (
    <View style={styles.stack}>
      {done.map((one, place) => (
        <View key={place} style={styles.row}>
          <View style={styles.part}>
            <Select
              label={t('sheet.renewedPart', { number: place + 1 })}
              value={one.component}
              onChange={(component) => replace(place, { component })}
              options={COMPONENTS.map((value) => ({ value, label: t(`vocabulary.component.${value}`) }))}
            />
          </View>
          <View style={styles.year}>
            <NumberField
              label={t('sheet.renewedYear', { number: place + 1 })}
              whole
              grouping={false}
              value={yearTyped(one.year)}
              onChange={(year) =>
                replace(place, { year: year ? { kind: 'exact', year, knownBy: 'told' } : { kind: 'unknown' } })
              }
            />
          </View>
          <IconButton
            icon="close"
            label={t('sheet.renewedRemove', { number: place + 1 })}
            onPress={() => set(done.filter((_, at) => at !== place))}
          />
        </View>
      ))}
      {faults.refurbishments ? <AppText tone="error">{faults.refurbishments}</AppText> : null}
      {done.length < MOST_REFURBISHMENTS ? (
        <Button
          kind="quiet"
          icon="plus"
          label={t('sheet.renewedAdd')}
          onPress={() => set([...done, { component: nextComponent(done), year: { kind: 'unknown' } }])}
        />
      ) : null}
    </View>
  )
}

/** The component that is renewed most often and is not named yet. */
function nextComponent(done: readonly Refurbishment[]): Refurbishment['component'] {
  const often = ['openings', 'roof', 'envelope', 'services', 'fit-out', 'structure'] as const
  return often.find((component) => !done.some((one) => one.component === component)) ?? 'openings'
}

function yearTyped(year: ConstructionYear): number | null {
  return year.kind === 'exact' ? year.year : null
}

const styles = StyleSheet.create({
  stack: { gap: SPACE.small },
  row: { flexDirection: 'row', alignItems: 'flex-end', gap: SPACE.small },
  part: { flex: 3, minWidth: 0 },
  year: { flex: 2, minWidth: 0 },
})
