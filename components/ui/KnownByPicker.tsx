import { useId, useState } from 'react'
import { Pressable, StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { Icon } from './Icon'
import { useMessages } from './MessagesProvider'
import { KNOWN_BY, type KnownBy } from '@/shared/schemas/sheet'
import { useTheme } from './theme/ThemeProvider'
import { RADIUS, SPACE, TARGET } from './theme/tokens'
import { webOnly } from './web/webOnly'

interface KnownByPickerProps {
  /** The answer it belongs to, for screen readers: "Storeys above ground". */
  readonly of: string
  readonly value: KnownBy | null
  readonly onChange: (knownBy: KnownBy) => void
  readonly disabled?: boolean
  /** The ways offered, when not all five make sense. */
  readonly ways?: readonly KnownBy[]
}

/** How an answer is known: one quiet word beside it, which opens the five ways to tap. */
export function KnownByPicker({ of, value, onChange, disabled = false, ways = KNOWN_BY }: KnownByPickerProps) {
  const { colours } = useTheme()
  const { t } = useMessages()
  const [isOpen, setIsOpen] = useState(false)
  const listId = useId()
  const said = value ? t(`vocabulary.knownBy.${value}`) : t('common.howKnown')
  return (
    <View style={[styles.picker, isOpen && styles.open]}>
      <Pressable
        role="button"
        aria-label={`${of}: ${t('common.howKnown')} ${value ? said : t('common.notAnswered')}`}
        aria-expanded={isOpen}
        disabled={disabled}
        onPress={() => setIsOpen(!isOpen)}
        {...webOnly({ 'aria-controls': isOpen ? listId : undefined })}
        style={styles.word}
      >
        <AppText soft={value !== null} tone={value === null ? 'attention' : undefined} weight="medium">
          {said}
        </AppText>
        <Icon name={isOpen ? 'up' : 'down'} size={16} colour={colours.inkSoft} />
      </Pressable>
      {isOpen ? (
        <View nativeID={listId} role="group" aria-label={t('common.howKnown')} style={styles.ways}>
          {ways.map((way) => (
            <Pressable
              key={way}
              role="button"
              onPress={() => {
                onChange(way)
                setIsOpen(false)
              }}
              {...webOnly({ 'aria-pressed': way === value })}
              style={[
                styles.way,
                { borderColor: colours.rule, backgroundColor: way === value ? colours.chosen : colours.field },
              ]}
            >
              <AppText weight="medium" style={{ color: way === value ? colours.onChosen : colours.ink }}>
                {t(`vocabulary.knownBy.${way}`)}
              </AppText>
            </Pressable>
          ))}
        </View>
      ) : null}
    </View>
  )
}

const styles = StyleSheet.create({
  picker: { alignItems: 'flex-end', marginTop: -SPACE.medium, marginBottom: -SPACE.small },
  open: { width: '100%', paddingBottom: SPACE.small },
  word: { minHeight: TARGET, flexDirection: 'row', alignItems: 'center', gap: SPACE.tight, paddingLeft: SPACE.small },
  ways: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.tight, alignSelf: 'stretch' },
  way: {
    minHeight: TARGET,
    flexGrow: 1,
    alignItems: 'center',
    justifyContent: 'center',
    borderWidth: 1.5,
    borderRadius: RADIUS,
    paddingHorizontal: SPACE.small,
  },
})
