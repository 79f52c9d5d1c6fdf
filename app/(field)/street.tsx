import { useRouter } from 'expo-router'
import { StreetScreen } from '@/components/street/StreetScreen'

export default function StreetRoute() {
  const router = useRouter()
  return <StreetScreen onOpenSheet={(buildingId) => router.push(`/sheet/${buildingId}`)} />
}
