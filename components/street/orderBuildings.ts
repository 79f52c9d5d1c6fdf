import { geodesicDistance } from '@/shared/compute/spatial/geodesicDistance'
import type { StoredBuilding } from '@/db/fieldStore.types'

export interface PlacedBuilding {
  readonly stored: StoredBuilding
  /** Null while the person's position is not known. */
  readonly distanceM: number | null
}

interface Place {
  readonly longitude: number
  readonly latitude: number
}

/** Buildings by distance, or by street and number while the position is not known. */
export function orderBuildings(buildings: readonly StoredBuilding[], from: Place | null): readonly PlacedBuilding[] {
  const placed = buildings.map((stored) => ({ stored, distanceM: from ? distanceTo(stored, from) : null }))
  if (from) return placed.sort((a, b) => (a.distanceM ?? 0) - (b.distanceM ?? 0))
  const words = new Intl.Collator(undefined, { numeric: true })
  const nameOf = ({ stored }: PlacedBuilding) => {
    const { street, houseNumber, reference } = stored.building.outline
    return `${street ?? '~'} ${houseNumber ?? ''} ${reference}`
  }
  return placed.sort((a, b) => words.compare(nameOf(a), nameOf(b)))
}

/** To the middle of the outline's corners; near enough to say which is next. */
function distanceTo({ building }: StoredBuilding, from: Place): number {
  const { geometry } = building
  const ring = (geometry.type === 'Polygon' ? geometry.coordinates[0] : geometry.coordinates[0]?.[0]) ?? []
  const corners = ring.slice(1)
  const longitude = corners.reduce((sum, [x]) => sum + x, 0) / corners.length
  const latitude = corners.reduce((sum, [, y]) => sum + y, 0) / corners.length
  return geodesicDistance([from.longitude, from.latitude], [longitude, latitude]).distanceM
}

/** Whether a building's street, number or reference holds the words. */
export function fitsSearch({ building }: StoredBuilding, words: string): boolean {
  const { street, houseNumber, reference } = building.outline
  return `${street ?? ''} ${houseNumber ?? ''} ${reference}`.toLowerCase().includes(words.trim().toLowerCase())
}
