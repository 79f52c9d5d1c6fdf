import { useId } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { useTheme } from './theme/ThemeProvider'
import { RADIUS, SPACE } from './theme/tokens'
import { webOnly } from './web/webOnly'

interface ProgressProps {
  /** What is going on: "Handing in". */
  readonly label: string
  /** Done so far, 0 to 1; null while it cannot be told. */
  readonly share: number | null
  /** At the right: "3 of 14 photos". */
  readonly note?: string
}

/** How far a piece of work has come. */
export function Progress({ label, share, note }: ProgressProps) {
  const { colours } = useTheme()
  const labelId = useId()
  const done = share === null ? null : Math.round(Math.min(1, Math.max(0, share)) * 100)
  return (
    <View style={styles.progress}>
      <View style={styles.head}>
        <AppText id={labelId} weight="medium">
          {label}
        </AppText>
        {note ? (
          <AppText kind="number" soft>
            {note}
          </AppText>
        ) : null}
      </View>
      <View
        role="progressbar"
        aria-labelledby={labelId}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={done ?? undefined}
        {...webOnly({ 'aria-valuetext': note })}
        style={[styles.trough, { borderColor: colours.rule, backgroundColor: colours.sunken }]}
      >
        <View
          style={[
            styles.fill,
            { backgroundColor: colours.action, width: done === null ? '100%' : `${done}%` },
            done === null && styles.untold,
          ]}
        />
      </View>
    </View>
  )
}

const styles = StyleSheet.create({
  progress: { gap: SPACE.tight },
  head: { flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', columnGap: SPACE.small },
  trough: { height: 14, borderWidth: 1.5, borderRadius: RADIUS, overflow: 'hidden' },
  fill: { height: '100%' },
  untold: { opacity: 0.35 },
})
