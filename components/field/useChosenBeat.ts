import { useState } from 'react'
import { deviceStorage } from '@/components/ui/theme/deviceStorage'
import type { StoredBeat } from '@/db/fieldStore.types'

const STORAGE_KEY = 'tallystone.beat'

/** The beat a surveyor works on, the same on every screen of the field and after a pause. */
export interface ChosenBeat {
  /** Undefined while none is here. */
  readonly current: StoredBeat | undefined
  readonly choose: (beatId: string) => void
}

/** @param beats beats on this phone, newest round first; undefined while they are read */
export function useChosenBeat(beats: readonly StoredBeat[] | undefined): ChosenBeat {
  const [storage] = useState(deviceStorage)
  const [chosen, setChosen] = useState(() => storage.getItem(STORAGE_KEY))
  return {
    current: beats?.find(({ beatId }) => beatId === chosen) ?? beats?.[0],
    choose(beatId) {
      storage.setItem(STORAGE_KEY, beatId)
      setChosen(beatId)
    },
  }
}
