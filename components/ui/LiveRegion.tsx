import { View } from 'react-native'
import { AppText } from './AppText'
import { webOnly } from './web/webOnly'

interface LiveRegionProps {
  /** Read out when it changes. Keep the region on the screen while its message is empty. */
  readonly message: string
  /** Breaks in on what is being read. */
  readonly urgent?: boolean
  /** Shows the message as well. */
  readonly visible?: boolean
}

/** Says to a screen reader what has changed. */
export function LiveRegion({ message, urgent = false, visible = false }: LiveRegionProps) {
  return (
    <View
      role={urgent ? 'alert' : 'status'}
      aria-live={urgent ? 'assertive' : 'polite'}
      {...webOnly({ 'aria-atomic': true })}
      style={visible ? undefined : unseen}
    >
      <AppText>{message}</AppText>
    </View>
  )
}

/** Not seen, yet read: a square of one pixel. */
export const unseen = { position: 'absolute', width: 1, height: 1, overflow: 'hidden', opacity: 0 } as const
