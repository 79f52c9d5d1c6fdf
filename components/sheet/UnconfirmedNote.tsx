import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import type { SheetGroup } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'

interface UnconfirmedNoteProps extends Pick<SectionProps, 'unconfirmed' | 'confirm'> {
  readonly group: SheetGroup
}

/** Under an answer nobody has confirmed: where it came from, and one tap to confirm it. */
export function UnconfirmedNote({ group, unconfirmed, confirm }: UnconfirmedNoteProps) {
  const { t } = useMessages()
  const from = unconfirmed[group]
  if (!from) return null
  return (
    <View style={styles.row}>
      <View style={styles.words}>
        <AppText tone="attention" weight="medium">
          {t(`sheet.unconfirmed.${from}`)}
        </AppText>
      </View>
      <Button
        icon="check"
        label={t('sheet.confirm')}
        accessibleLabel={t('sheet.confirmOf', { answer: t(`sheet.group.${group}`) })}
        onPress={() => confirm([group])}
      />
    </View>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', gap: SPACE.small, marginTop: -SPACE.tight },
  words: { flexGrow: 1, flexShrink: 1 },
})
