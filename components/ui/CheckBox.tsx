import { useId } from 'react'
import { Pressable, StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { Icon } from './Icon'
import { useTheme } from './theme/ThemeProvider'
import { RADIUS, SPACE, TARGET } from './theme/tokens'
import { webOnly } from './web/webOnly'

interface CheckBoxProps {
  readonly label: string
  readonly checked: boolean
  readonly onChange: (checked: boolean) => void
  readonly onBlur?: () => void
  readonly hint?: string
  readonly error?: string
  readonly disabled?: boolean
}

/** Yes or no, for one thing. */
export function CheckBox({ label, checked, onChange, onBlur, hint, error, disabled = false }: CheckBoxProps) {
  const { colours } = useTheme()
  const noteId = useId()
  const note = error ?? hint
  return (
    <View>
      <Pressable
        role="checkbox"
        aria-checked={checked}
        aria-label={label}
        aria-disabled={disabled}
        disabled={disabled}
        onPress={() => onChange(!checked)}
        onBlur={onBlur}
        {...webOnly({ 'aria-describedby': note ? noteId : undefined, 'aria-invalid': error ? true : undefined })}
        style={[styles.row, disabled && styles.off]}
      >
        <View
          style={[
            styles.box,
            {
              borderColor: error ? colours.error : colours.rule,
              backgroundColor: checked ? colours.chosen : colours.field,
            },
          ]}
        >
          {checked ? <Icon name="check" size={18} colour={colours.onChosen} /> : null}
        </View>
        <AppText kind="lead" weight="medium" style={styles.label}>
          {label}
        </AppText>
      </Pressable>
      {note ? (
        <View style={styles.note}>
          <AppText id={noteId} soft={!error} tone={error ? 'error' : undefined}>
            {note}
          </AppText>
        </View>
      ) : null}
    </View>
  )
}

const BOX = 26

const styles = StyleSheet.create({
  row: { minHeight: TARGET, flexDirection: 'row', alignItems: 'center', gap: SPACE.medium, borderRadius: RADIUS },
  box: {
    width: BOX,
    height: BOX,
    borderWidth: 1.5,
    borderRadius: RADIUS,
    alignItems: 'center',
    justifyContent: 'center',
  },
  label: { flexShrink: 1 },
  note: { paddingLeft: BOX + SPACE.medium },
  off: { opacity: 0.5 },
})
