import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { IconButton } from '@/components/ui/IconButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Select } from '@/components/ui/Select'
import { SPACE } from '@/components/ui/theme/tokens'
import { USES } from '@/shared/compute/factors/vocabulary'
import { formatShare } from '@/shared/format'
import { MOST_OTHER_USES, type OtherUse, type SheetAnswers } from '@/shared/schemas/sheet'

type UseAnswer = NonNullable<SheetAnswers['use']>

interface OtherUsesProps {
  readonly use: UseAnswer
  readonly onChange: (use: UseAnswer) => void
}

/** Further uses with their shares of the floor area; what they leave is the main use's. */
export function OtherUses({ use, onChange }: OtherUsesProps) {
  const { t, locale } = useMessages()
  const others = use.otherUses ?? []
  const set = (otherUses: readonly OtherUse[]) => {
    const { otherUses: _, ...rest } = use
    onChange(otherUses.length === 0 ? rest : { ...rest, otherUses: [...otherUses] })
  }
  const replace = (place: number, next: OtherUse) => set(others.map((other, at) => (at === place ? next : other)))
  const mainShare = others.reduce((share, other) => share - other.share, 1)
  const free = USES.filter((one) => one !== use.use && !others.some((other) => other.use === one))
  const add = () => {
    const [first] = free
    if (first) set([...others, { use: free.includes('retail') ? 'retail' : first, share: 0.25 }])
  }
  return (
    <View style={styles.stack}>
      {others.map((other, place) => (
        <View key={place} style={styles.row}>
          <View style={styles.use}>
            <Select
              label={t('sheet.otherUse', { number: place + 2 })}
              value={other.use}
              onChange={(next) => replace(place, { ...other, use: next })}
              options={USES.filter((one) => one === other.use || free.includes(one)).map((value) => ({
                value,
                label: t(`vocabulary.use.${value}`),
              }))}
            />
          </View>
          <View style={styles.share}>
            <NumberField
              label={t('sheet.otherUseShare', { number: place + 2 })}
              unit="%"
              value={other.share > 0 ? Math.round(other.share * 1000) / 10 : null}
              onChange={(percent) =>
                replace(place, { ...other, share: Math.min(1, Math.max(0, (percent ?? 0) / 100)) })
              }
            />
          </View>
          <IconButton
            icon="close"
            label={t('sheet.otherUseRemove', { number: place + 2 })}
            onPress={() => set(others.filter((_, at) => at !== place))}
          />
        </View>
      ))}
      {others.length > 0 ? (
        <AppText soft={mainShare > 0} tone={mainShare > 0 ? undefined : 'error'}>
          {mainShare > 0
            ? t('sheet.mainUseShare', { share: formatShare(mainShare, locale) })
            : t('sheet.mainUseNoShare')}
        </AppText>
      ) : null}
      {others.length < MOST_OTHER_USES ? (
        <Button kind="quiet" icon="plus" label={t('sheet.otherUseAdd')} onPress={add} />
      ) : null}
    </View>
  )
}

const styles = StyleSheet.create({
  stack: { gap: SPACE.small },
  row: { flexDirection: 'row', alignItems: 'flex-end', gap: SPACE.small },
  use: { flex: 3, minWidth: 0 },
  share: { flex: 2, minWidth: 0 },
})
