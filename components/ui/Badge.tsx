import { StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { useTheme } from './theme/ThemeProvider'
import { RADIUS, SPACE, toneColour, type Tone } from './theme/tokens'

interface BadgeProps {
  readonly label: string
  /** Ink when left out. The label says what the colour says. */
  readonly tone?: Tone
}

/** A framed word: a state, a revision, "no network". */
export function Badge({ label, tone = 'ink' }: BadgeProps) {
  const { colours } = useTheme()
  return (
    <View style={styles.line}>
      <View style={[styles.badge, { borderColor: toneColour(tone, colours), backgroundColor: colours.panel }]}>
        <AppText kind="label" tone={tone} weight="semibold">
          {label}
        </AppText>
      </View>
    </View>
  )
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row' },
  badge: {
    borderWidth: 1.5,
    borderRadius: RADIUS,
    paddingHorizontal: SPACE.small,
    paddingVertical: SPACE.hair,
  },
})
