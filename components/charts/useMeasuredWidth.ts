import { useCallback, useState } from 'react'
import type { LayoutChangeEvent } from 'react-native'

/** Width before the first measure [px]: a phone's panel. */
const FIRST_WIDTH_PX = 340

/** Width that a chart is given, and the `onLayout` that measures it. */
export function useMeasuredWidth(): readonly [widthPx: number, onLayout: (event: LayoutChangeEvent) => void] {
  const [widthPx, setWidthPx] = useState(FIRST_WIDTH_PX)
  const onLayout = useCallback((event: LayoutChangeEvent) => {
    const measured = Math.round(event.nativeEvent.layout.width)
    if (measured > 0) setWidthPx(measured)
  }, [])
  return [widthPx, onLayout]
}
