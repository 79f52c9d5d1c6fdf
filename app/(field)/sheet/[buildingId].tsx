import { useLocalSearchParams, useRouter } from 'expo-router'
import { SheetScreen } from '@/components/sheet/SheetScreen'

export default function SheetRoute() {
  const { buildingId } = useLocalSearchParams<{ buildingId: string }>()
  const router = useRouter()
  return (
    <SheetScreen
      buildingId={buildingId}
      onBack={() => (router.canGoBack() ? router.back() : router.replace('/street'))}
    />
  )
}
