import type { StoredBuilding } from '@/db/fieldStore.types'
import type { DeviceLook, DeviceLooks } from '@/shared/schemas/nextLook'

/** A building to look at next; without a look where no ranking has come to this device. */
export interface NextBuilding {
  readonly stored: StoredBuilding
  readonly look: DeviceLook | null
}

const MOST = 5
const UNRANKED = Number.MAX_SAFE_INTEGER

/**
 * What to look at next of a beat: what was begun, then the list of the round, most telling first. What was recorded and
 * is still in doubt is on it; what lies in the bag is not. Without a list the largest unrecorded buildings stand in.
 */
export function nextOnBeat(buildings: readonly StoredBuilding[], list: DeviceLooks | null): readonly NextBuilding[] {
  const lookOf = new Map(list?.looks.map((look) => [look.buildingId, look]))
  return buildings
    .map((stored): NextBuilding => ({ stored, look: lookOf.get(stored.buildingId) ?? null }))
    .filter(({ stored: { state }, look }) => isOpen(state) || (look?.isRecorded === true && isWithServer(state)))
    .sort(
      (a, b) =>
        Number(b.stored.state === 'started') - Number(a.stored.state === 'started') ||
        (a.look?.rank ?? UNRANKED) - (b.look?.rank ?? UNRANKED) ||
        b.stored.building.outline.footprintM2 - a.stored.building.outline.footprintM2,
    )
    .slice(0, MOST)
}

function isOpen(state: StoredBuilding['state']): boolean {
  return state === 'started' || state === 'to-do'
}

function isWithServer(state: StoredBuilding['state']): boolean {
  return state === 'handed-in' || state === 'checked'
}
