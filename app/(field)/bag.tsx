import { useRouter } from 'expo-router'
import { BagScreen } from '@/components/bag/BagScreen'

export default function BagRoute() {
  const router = useRouter()
  return (
    <BagScreen
      onOpenSheet={(buildingId) => router.push(`/sheet/${buildingId}`)}
      onSignIn={() => router.push('/sign-in')}
    />
  )
}
