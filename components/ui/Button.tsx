import { ActivityIndicator, Pressable, StyleSheet } from 'react-native'
import { AppText } from './AppText'
import { Icon } from './Icon'
import type { IconName } from './iconLines'
import { keepInApp } from './keepInApp'
import { useMessages } from './MessagesProvider'
import { useTheme } from './theme/ThemeProvider'
import { RADIUS, SPACE, TARGET, type Colours } from './theme/tokens'
import { webOnly } from './web/webOnly'

/** `primary`: the one thing to do; `secondary`: framed; `quiet`: text only; `danger`: what cannot be undone. */
export type ButtonKind = 'primary' | 'secondary' | 'quiet' | 'danger'

export interface ButtonProps {
  readonly label: string
  readonly onPress?: () => void
  /** `secondary` when left out. */
  readonly kind?: ButtonKind
  readonly icon?: IconName
  /** Shows that the work is under way and takes no second press. */
  readonly busy?: boolean
  readonly disabled?: boolean
  /** Takes the width that is left in a row. */
  readonly grow?: boolean
  /** What a screen reader says instead of the label, when the label alone is not enough ("Open Tar Lane 12"). */
  readonly accessibleLabel?: string
  /** Makes it a link to this address; `onPress` is still called, and the browser does not leave the app. */
  readonly href?: string
  /** Whether what it opens is open. */
  readonly expanded?: boolean
  /** Pressed state of a button that stays down. */
  readonly pressed?: boolean
}

/** Something to press, 48 px or more in height. */
export function Button(props: ButtonProps) {
  const { label, onPress, kind = 'secondary', icon, busy = false, disabled = false, grow, href } = props
  const { colours } = useTheme()
  const { t } = useMessages()
  const isOff = disabled || busy
  const look = lookOf(kind, colours, props.pressed === true)
  return (
    <Pressable
      role={href ? 'link' : 'button'}
      aria-label={props.accessibleLabel ?? label}
      aria-busy={busy}
      aria-disabled={isOff}
      aria-expanded={props.expanded}
      disabled={isOff}
      onPress={(event) => {
        if (!href || keepInApp(event)) onPress?.()
      }}
      {...webOnly({ href, 'aria-pressed': props.pressed, dataSet: { motion: '', printHide: '' } })}
      style={({ pressed }) => [
        styles.button,
        kind === 'quiet' && styles.quiet,
        { backgroundColor: look.fill, borderColor: look.frame },
        grow && styles.grow,
        disabled && styles.disabled,
        pressed && styles.down,
      ]}
    >
      {busy ? (
        <ActivityIndicator size="small" color={look.text} aria-label={t('common.busy')} />
      ) : icon ? (
        <Icon name={icon} size={20} colour={look.text} />
      ) : null}
      <AppText kind="lead" align="center" style={{ color: look.text }}>
        {label}
      </AppText>
    </Pressable>
  )
}

interface ButtonLook {
  readonly fill: string
  readonly frame: string
  readonly text: string
}

function lookOf(kind: ButtonKind, colours: Colours, isDown: boolean): ButtonLook {
  if (isDown) return { fill: colours.chosen, frame: colours.chosen, text: colours.onChosen }
  switch (kind) {
    case 'primary':
      return { fill: colours.action, frame: colours.action, text: colours.onAction }
    case 'danger':
      return { fill: colours.error, frame: colours.error, text: colours.onError }
    case 'quiet':
      return { fill: 'transparent', frame: 'transparent', text: colours.action }
    case 'secondary':
      return { fill: colours.field, frame: colours.action, text: colours.action }
  }
}

const styles = StyleSheet.create({
  button: {
    minHeight: TARGET,
    minWidth: TARGET,
    paddingHorizontal: SPACE.large,
    paddingVertical: SPACE.small,
    borderWidth: 1.5,
    borderRadius: RADIUS,
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: 'center',
    gap: SPACE.small,
  },
  quiet: { paddingHorizontal: SPACE.small },
  grow: { flexGrow: 1, flexShrink: 1 },
  disabled: { opacity: 0.5 },
  down: { opacity: 0.8 },
})
