import { useCallback, useState } from 'react'
import type { MapPosition } from '@/components/map/OutlineMap.types'

export type Locating = 'not-asked' | 'locating' | 'found' | 'denied' | 'failed'

/** The person's own position, asked for once a press; nothing is tracked or sent. */
export function useOwnPosition() {
  const [locating, setLocating] = useState<Locating>('not-asked')
  const [position, setPosition] = useState<MapPosition | null>(null)
  const locate = useCallback(() => {
    if (!globalThis.navigator?.geolocation) {
      setLocating('failed')
      return
    }
    setLocating('locating')
    globalThis.navigator.geolocation.getCurrentPosition(
      ({ coords }) => {
        setPosition({ longitude: coords.longitude, latitude: coords.latitude, accuracyM: coords.accuracy })
        setLocating('found')
      },
      (fault) => setLocating(fault.code === fault.PERMISSION_DENIED ? 'denied' : 'failed'),
      { enableHighAccuracy: true, timeout: 20_000, maximumAge: 10_000 },
    )
  }, [])
  return { locating, position, locate }
}
