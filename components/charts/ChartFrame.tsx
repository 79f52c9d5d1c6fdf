import type { MouseEvent, ReactNode } from 'react'
import { Platform, View, type GestureResponderEvent } from 'react-native'
import Svg from 'react-native-svg'
import { useMeasuredWidth } from './useMeasuredWidth'

interface ChartFrameProps {
  /** What the chart shows, in one sentence; the table beside it holds the figures. */
  readonly label: string
  readonly heightPx: number
  /** A press, and where it fell from the left [px]. */
  readonly onPressAt?: (xPx: number, widthPx: number) => void
  /** Draws the chart in the width it is given [px]. */
  readonly children: (widthPx: number) => ReactNode
}

/** A drawing as wide as its place, one image to screen readers. */
export function ChartFrame({ label, heightPx, onPressAt, children }: ChartFrameProps) {
  const [widthPx, onLayout] = useMeasuredWidth()
  return (
    <View
      role="img"
      aria-label={label}
      onLayout={onLayout}
      {...(onPressAt ? pressPlace((xPx) => onPressAt(xPx, widthPx)) : {})}
      style={{ width: '100%', height: heightPx }}
    >
      <Svg width={widthPx} height={heightPx} viewBox={`0 0 ${widthPx} ${heightPx}`}>
        {children(widthPx)}
      </Svg>
    </View>
  )
}

/** A drawing takes presses as a whole; the table beside it is the way of the keyboard. */
function pressPlace(onPressAt: (xPx: number) => void): object {
  if (Platform.OS === 'web') {
    return {
      onClick: (event: MouseEvent<HTMLElement>) =>
        onPressAt(event.clientX - event.currentTarget.getBoundingClientRect().left),
    }
  }
  return {
    onStartShouldSetResponder: () => true,
    onResponderRelease: (event: GestureResponderEvent) => onPressAt(event.nativeEvent.locationX),
  }
}
