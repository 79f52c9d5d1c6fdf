import { LOOK_ATTRIBUTES } from '@/shared/compute/nextLook/nextLook.types'
import type { RankedLook } from '@/shared/schemas/nextLook'

/** The list with all digits: for each building the fall if all is settled, and attribute by attribute. */
export function lookCsvRows(looks: readonly RankedLook[], beatNameOf: (beatId: string | null) => string) {
  return [
    [
      'rank',
      'building',
      'beat',
      'state',
      'use',
      'narrows',
      'is_large',
      'floor_area_m2',
      'expected_kg',
      'fall_kg2',
      'share_of_variance',
      'share_of_what_looking_settles',
      ...LOOK_ATTRIBUTES.map((attribute) => `fall_${attribute}_kg2`),
      'building_id',
    ],
    ...looks.map((look, place) => [
      place + 1,
      look.label,
      beatNameOf(look.beatId),
      look.state,
      look.use,
      look.reason.narrows,
      String(look.reason.isLarge),
      look.floorAreaM2,
      look.meanKg,
      look.fallKg2,
      look.fallShare,
      look.settleShare,
      ...LOOK_ATTRIBUTES.map((attribute) => look.byAttributeKg2[attribute]),
      look.buildingId,
    ]),
  ]
}
