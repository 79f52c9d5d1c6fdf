import type { OutlinePaint } from '@/components/map/OutlineMap.types'
import type { Colours } from '@/components/ui/theme/tokens'
import type { DeviceLook } from '@/shared/schemas/nextLook'

/** How much a look at an unrecorded building tells, in three steps of the beat's own list. */
export const LOOK_SHADES = ['shadeFirst', 'shadeThen', 'shadeLast'] as const
export type LookShade = (typeof LOOK_SHADES)[number]

const FIRST_SHARE = 0.1
const THEN_SHARE = 0.4

/**
 * Shades of the buildings of a beat: the first tenth of the list, down to two fifths, and the rest.
 *
 * @param looks of one beat, the most telling first
 * @example lookShades([{ buildingId: 'a', rank: 3, settleShare: 0.1, reason: { narrows: 'use', isLarge: true }, isRecorded: false }]).get('a') // => 'shadeFirst'
 */
export function lookShades(looks: readonly DeviceLook[]): ReadonlyMap<string, LookShade> {
  return new Map(
    looks.map(({ buildingId }, place) => {
      const before = place / looks.length
      return [buildingId, before < FIRST_SHARE ? 'shadeFirst' : before < THEN_SHARE ? 'shadeThen' : 'shadeLast']
    }),
  )
}

const OPACITY: Readonly<Record<LookShade, number>> = { shadeFirst: 0.8, shadeThen: 0.4, shadeLast: 0.12 }

/** Deeper where a look tells more, and with a heavier edge where to look first: told apart without colour too. */
export function lookPaint(shade: LookShade, colours: Colours): OutlinePaint {
  return {
    fill: colours.selection,
    outline: colours.selection,
    opacity: OPACITY[shade],
    outlinePx: shade === 'shadeFirst' ? 3 : 1,
  }
}
