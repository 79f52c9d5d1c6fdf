import { Pressable, StyleSheet } from 'react-native'
import { Icon } from './Icon'
import type { IconName } from './iconLines'
import { useTheme } from './theme/ThemeProvider'
import { RADIUS, TARGET } from './theme/tokens'
import { webOnly } from './web/webOnly'

interface IconButtonProps {
  readonly icon: IconName
  /** What a screen reader says, and the tip under the pointer. */
  readonly label: string
  readonly onPress: () => void
  readonly disabled?: boolean
  /** Pressed state of a button that stays down. */
  readonly pressed?: boolean
  /** Frame and fill, for a button that lies on a map or a picture. */
  readonly framed?: boolean
}

/** A square of 48 px with a drawing, where there is no room for a word. */
export function IconButton({ icon, label, onPress, disabled = false, pressed, framed = false }: IconButtonProps) {
  const { colours } = useTheme()
  const fill = pressed ? colours.chosen : framed ? colours.panel : 'transparent'
  return (
    <Pressable
      role="button"
      aria-label={label}
      aria-disabled={disabled}
      disabled={disabled}
      onPress={onPress}
      {...webOnly({ title: label, 'aria-pressed': pressed, dataSet: { motion: '', printHide: '' } })}
      style={[
        styles.square,
        { backgroundColor: fill, borderColor: framed ? colours.rule : 'transparent' },
        disabled && styles.disabled,
      ]}
    >
      <Icon name={icon} colour={pressed ? colours.onChosen : colours.ink} />
    </Pressable>
  )
}

const styles = StyleSheet.create({
  square: {
    width: TARGET,
    height: TARGET,
    borderWidth: 1.5,
    borderRadius: RADIUS,
    alignItems: 'center',
    justifyContent: 'center',
  },
  disabled: { opacity: 0.45 },
})
