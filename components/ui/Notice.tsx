import type { ReactNode } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { Panel } from './Panel'
import { SPACE, type Tone } from './theme/tokens'

interface NoticeProps {
  /** In one sentence. */
  readonly whatHappened: string
  /** What was kept, and where. */
  readonly whatIsSafe?: string
  readonly whatToDo?: string
  /** Error when left out. */
  readonly tone?: Tone
  /** Buttons that do it. */
  readonly action?: ReactNode
  /** Read out at once (an error that has just come), or when the reader pauses. */
  readonly urgent?: boolean
  readonly children?: ReactNode
}

/** Tells of a fault or a caution: what happened, what is safe, what to do. */
export function Notice({
  whatHappened,
  whatIsSafe,
  whatToDo,
  tone = 'error',
  action,
  urgent = false,
  children,
}: NoticeProps) {
  return (
    <View role={urgent ? 'alert' : 'status'}>
      <Panel tone={tone}>
        <View style={styles.lines}>
          <AppText kind="lead">{whatHappened}</AppText>
          {whatIsSafe ? <AppText>{whatIsSafe}</AppText> : null}
          {whatToDo ? <AppText>{whatToDo}</AppText> : null}
          {children}
        </View>
        {action ? <View style={styles.action}>{action}</View> : null}
      </Panel>
    </View>
  )
}

const styles = StyleSheet.create({
  lines: { gap: SPACE.tight },
  action: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small },
})
