import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import { SPACE } from '@/components/ui/theme/tokens'
import { STRUCTURES, USES } from '@/shared/compute/factors/vocabulary'
import { formatArea } from '@/shared/format'
import { MOST_PARTS, type BuildingPart } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'
import { GroupKnownBy } from './GroupKnownBy'
import { PartYears } from './PartYears'

/** Wings and extensions with an age, a structure and a size of their own. */
export function PartsSection({ answers, faults, answer }: SectionProps) {
  const { t, locale } = useMessages()
  const { parts: group, footprint } = answers
  const parts = group?.parts ?? []
  const set = (next: readonly BuildingPart[]) => answer('parts', { knownBy: 'guessed', ...group, parts: [...next] })
  const leftM2 = (footprint?.footprintM2 ?? 0) - parts.reduce((sum, { footprintM2 }) => sum + footprintM2, 0)
  return (
    <Panel
      title={t('sheet.parts.title')}
      note={parts.length > 0 ? t('sheet.parts.count', { count: parts.length }) : undefined}
    >
      <AppText soft>{t('sheet.parts.how')}</AppText>
      {parts.map((part, place) => (
        <PartFields
          key={place}
          part={part}
          number={place + 1}
          onChange={(next) => set(parts.map((one, at) => (at === place ? next : one)))}
          onRemove={() => set(parts.filter((_, at) => at !== place))}
        />
      ))}
      {parts.length > 0 && footprint ? (
        <View style={styles.row}>
          <View style={styles.grow}>
            <AppText soft={leftM2 >= 0} tone={leftM2 >= 0 ? undefined : 'error'}>
              {leftM2 >= 0
                ? t('sheet.parts.left', { area: formatArea(leftM2, locale) })
                : t('sheet.parts.tooLarge', { area: formatArea(-leftM2, locale) })}
            </AppText>
          </View>
          <GroupKnownBy of={t('sheet.parts.title')} answer={group} isKnown onChange={(next) => answer('parts', next)} />
        </View>
      ) : null}
      {faults.parts ? <AppText tone="error">{faults.parts}</AppText> : null}
      {parts.length < MOST_PARTS ? (
        <Button
          kind="quiet"
          icon="plus"
          label={t('sheet.parts.add')}
          onPress={() => set([...parts, emptyPart(t('sheet.parts.nameOf', { number: parts.length + 1 }))])}
        />
      ) : null}
    </Panel>
  )
}

function emptyPart(name: string): BuildingPart {
  return {
    name,
    footprintM2: 0,
    aboveGround: 1,
    use: null,
    structure: 'unknown',
    constructionYear: { kind: 'unknown' },
  }
}

interface PartFieldsProps {
  readonly part: BuildingPart
  readonly number: number
  readonly onChange: (part: BuildingPart) => void
  readonly onRemove: () => void
}

function PartFields({ part, number, onChange, onRemove }: PartFieldsProps) {
  const { t } = useMessages()
  return (
    <View style={styles.part}>
      <TextField
        label={t('sheet.parts.name', { number })}
        maxLength={80}
        value={part.name}
        onChange={(name) => onChange({ ...part, name })}
      />
      <View style={styles.row}>
        <View style={styles.grow}>
          <NumberField
            label={t('sheet.parts.footprint', { number })}
            unit="m²"
            value={part.footprintM2 > 0 ? part.footprintM2 : null}
            onChange={(footprintM2) => onChange({ ...part, footprintM2: footprintM2 ?? 0 })}
          />
        </View>
        <View style={styles.grow}>
          <NumberField
            label={t('sheet.parts.storeys', { number })}
            value={part.aboveGround}
            onChange={(aboveGround) => onChange({ ...part, aboveGround })}
          />
        </View>
      </View>
      <Select
        label={t('sheet.parts.structure', { number })}
        value={part.structure}
        onChange={(structure) => onChange({ ...part, structure })}
        options={[...STRUCTURES, 'unknown' as const].map((value) => ({
          value,
          label: t(`vocabulary.structure.${value}`),
        }))}
      />
      <Select
        label={t('sheet.parts.use', { number })}
        value={part.use ?? 'as-main'}
        onChange={(use) => onChange({ ...part, use: use === 'as-main' ? null : use })}
        options={[
          { value: 'as-main' as const, label: t('sheet.parts.asMain') },
          ...USES.map((value) => ({ value, label: t(`vocabulary.use.${value}`) })),
        ]}
      />
      <PartYears
        number={number}
        year={part.constructionYear}
        onChange={(constructionYear) => onChange({ ...part, constructionYear })}
      />
      <Button kind="quiet" icon="close" label={t('sheet.parts.remove', { number })} onPress={onRemove} />
    </View>
  )
}

const styles = StyleSheet.create({
  part: { gap: SPACE.small, paddingVertical: SPACE.small },
  row: { flexDirection: 'row', alignItems: 'flex-end', gap: SPACE.small },
  grow: { flex: 1, minWidth: 0 },
})
