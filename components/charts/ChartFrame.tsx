import type { ReactNode } from 'react'
import { View } from 'react-native'
import Svg from 'react-native-svg'
import { useMeasuredWidth } from './useMeasuredWidth'

interface ChartFrameProps {
  /** What the chart shows, in one sentence; the table beside it holds the figures. */
  readonly label: string
  readonly heightPx: number
  /** Draws the chart in the width it is given [px]. */
  readonly children: (widthPx: number) => ReactNode
}

/** A drawing as wide as its place, one image to screen readers. */
export function ChartFrame({ label, heightPx, children }: ChartFrameProps) {
  const [widthPx, onLayout] = useMeasuredWidth()
  return (
    <View role="img" aria-label={label} onLayout={onLayout} style={{ width: '100%', height: heightPx }}>
      <Svg width={widthPx} height={heightPx} viewBox={`0 0 ${widthPx} ${heightPx}`}>
        {children(widthPx)}
      </Svg>
    </View>
  )
}
