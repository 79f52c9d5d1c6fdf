import type { ReactNode } from 'react'
import { StyleSheet, View } from 'react-native'
import Svg, { Path } from 'react-native-svg'
import { AppText } from './AppText'
import { useTheme } from './theme/ThemeProvider'
import { SPACE } from './theme/tokens'

interface EmptyStateProps {
  /** What is not there yet. */
  readonly title: string
  /** How it comes to be there. */
  readonly text?: string
  /** Buttons that bring it about. */
  readonly action?: ReactNode
}

/** Stands where something will be: the first stones of a wall, what is missing, and how to begin. */
export function EmptyState({ title, text, action }: EmptyStateProps) {
  const { colours } = useTheme()
  return (
    <View style={styles.state}>
      <Svg width={96} height={44} viewBox="0 0 96 44" fill="none" aria-hidden>
        <Path d="M1 29.5h30v13H1zM33 29.5h30v13H33zM65 29.5h30v13H65z" stroke={colours.inkSoft} strokeWidth={1.5} />
        <Path d="M17 15.5h30v13H17z" stroke={colours.inkSoft} strokeWidth={1.5} />
        <Path
          d="M49 15.5h30v13H49zM33 1.500h30v13H33z"
          stroke={colours.inkSoft}
          strokeWidth={1.5}
          strokeDasharray="3 3"
        />
      </Svg>
      <AppText kind="lead" align="center">
        {title}
      </AppText>
      {text ? (
        <AppText soft align="center" style={styles.text}>
          {text}
        </AppText>
      ) : null}
      {action ? <View style={styles.action}>{action}</View> : null}
    </View>
  )
}

const styles = StyleSheet.create({
  state: { alignItems: 'center', gap: SPACE.small, paddingVertical: SPACE.wide, paddingHorizontal: SPACE.large },
  text: { maxWidth: 420 },
  action: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    justifyContent: 'center',
    gap: SPACE.small,
    paddingTop: SPACE.small,
  },
})
