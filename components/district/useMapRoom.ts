import { useWindowDimensions } from 'react-native'

/** From this width on the map fills the height and the panels stand beside it [px]. */
const BESIDE_FROM_PX = 1100
/** Height of the map where the panels come under it [px]. */
const HEIGHT_PX = 380

/** How much room the map has: all there is beside its panels, or a part of a page that scrolls. */
export function useMapRoom(): { readonly fills: boolean; readonly heightPx: number | undefined } {
  const fills = useWindowDimensions().width >= BESIDE_FROM_PX
  return { fills, heightPx: fills ? undefined : HEIGHT_PX }
}
