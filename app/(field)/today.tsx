import { useRouter } from 'expo-router'
import { TodayScreen } from '@/components/today/TodayScreen'

export default function TodayRoute() {
  const router = useRouter()
  return (
    <TodayScreen
      onOpenSheet={(buildingId) => router.push(`/sheet/${buildingId}`)}
      onOpenStreet={() => router.push('/street')}
      onOpenBag={() => router.push('/bag')}
    />
  )
}
