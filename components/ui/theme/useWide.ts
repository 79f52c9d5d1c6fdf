import { useWindowDimensions } from 'react-native'
import { WIDE_FROM_PX } from './tokens'

/** Whether the window is wide enough for a desk's layout; false on a phone. */
export function useWide(): boolean {
  return useWindowDimensions().width >= WIDE_FROM_PX
}
