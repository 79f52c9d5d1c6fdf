import type { OutlinePaint } from '@/components/map/OutlineMap.types'
import type { Colours } from '@/components/ui/theme/tokens'
import type { DeviceSheetState } from '@/shared/schemas/sheet'

/** Colour and hatch of a sheet's state on the map: told apart without colour too. */
export function statePaint(state: DeviceSheetState, colours: Colours): OutlinePaint {
  const edge = { outline: colours.rule }
  switch (state) {
    case 'handed-in':
      return { ...edge, fill: colours.good, opacity: 0.45 }
    case 'checked':
      return { ...edge, fill: colours.good }
    case 'in-the-bag':
      return { ...edge, hatch: 'masonry-units' }
    case 'sent-back':
      return { outline: colours.error, fill: colours.error, opacity: 0.6, outlinePx: 3 }
    case 'started':
      return { outline: colours.attention, fill: colours.attention, opacity: 0.4, outlinePx: 2 }
    case 'to-do':
      return { ...edge, fill: colours.field }
  }
}
