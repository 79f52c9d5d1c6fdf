import { useCallback, useEffect, useState } from 'react'
import type { MapPosition } from '@/components/map/OutlineMap.types'

export type Locating = 'not-asked' | 'locating' | 'found' | 'denied' | 'failed'

const ASKED = { enableHighAccuracy: true, timeout: 20_000, maximumAge: 10_000 } as const

/**
 * The person's own position: asked for once a press, or kept up with while "follow me" is on and the screen is open.
 * Nothing is kept or sent.
 */
export function useOwnPosition() {
  const [locating, setLocating] = useState<Locating>('not-asked')
  const [position, setPosition] = useState<MapPosition | null>(null)
  const [isFollowing, setIsFollowing] = useState(false)
  const found = useCallback(({ coords }: GeolocationPosition) => {
    setPosition({ longitude: coords.longitude, latitude: coords.latitude, accuracyM: coords.accuracy })
    setLocating('found')
  }, [])
  const failed = useCallback((fault: GeolocationPositionError) => {
    setLocating(fault.code === fault.PERMISSION_DENIED ? 'denied' : 'failed')
    // who has been refused is not asked again and again
    if (fault.code === fault.PERMISSION_DENIED) setIsFollowing(false)
  }, [])
  const locate = useCallback(() => {
    if (!globalThis.navigator?.geolocation) {
      setLocating('failed')
      return
    }
    setLocating('locating')
    globalThis.navigator.geolocation.getCurrentPosition(found, failed, ASKED)
  }, [found, failed])
  useEffect(() => {
    if (!isFollowing || !globalThis.navigator?.geolocation) return
    const watch = globalThis.navigator.geolocation.watchPosition(found, failed, ASKED)
    return () => globalThis.navigator.geolocation.clearWatch(watch)
  }, [isFollowing, found, failed])
  const follow = useCallback(
    (isOn: boolean) => {
      setIsFollowing(isOn)
      if (isOn) locate()
    },
    [locate],
  )
  return { locating, position, locate, isFollowing, follow }
}
