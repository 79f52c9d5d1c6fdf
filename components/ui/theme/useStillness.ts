import { useEffect, useState } from 'react'
import { AccessibilityInfo } from 'react-native'

/** Whether the person asked the system for less motion; then nothing may move. */
export function useStillness(): boolean {
  const [isStill, setIsStill] = useState(true)

  useEffect(() => {
    let isMounted = true
    void AccessibilityInfo.isReduceMotionEnabled().then((enabled) => {
      if (isMounted) setIsStill(enabled)
    })
    const listening = AccessibilityInfo.addEventListener('reduceMotionChanged', setIsStill)
    return () => {
      isMounted = false
      listening?.remove()
    }
  }, [])

  return isStill
}
