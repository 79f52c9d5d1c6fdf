import { useMemo } from 'react'
import type { FieldStore, StoredBuilding } from '@/db/fieldStore.types'
import { useStored } from '@/sync/react/FieldProvider'
import { lookShades } from './lookShade'

const readNextLooks = (store: FieldStore) => store.readNextLooks()

/** How much a look at each building of a beat would tell; empty while this device has no list of the round. */
export function useLookShades(buildings: readonly StoredBuilding[]): ReturnType<typeof lookShades> {
  const lists = useStored(readNextLooks)
  return useMemo(() => {
    const ids = new Set(buildings.map(({ buildingId }) => buildingId))
    const roundId = buildings[0]?.building.roundId
    const looks = lists?.find((list) => list.roundId === roundId)?.looks ?? []
    return lookShades(looks.filter(({ buildingId }) => ids.has(buildingId)))
  }, [buildings, lists])
}
