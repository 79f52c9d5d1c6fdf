import { useLocalSearchParams, useRouter } from 'expo-router'
import { FactorBookScreen } from '@/components/factors/FactorBookScreen'

export default function FactorBookRoute() {
  const { edition } = useLocalSearchParams<{ edition?: string }>()
  const router = useRouter()
  return (
    <FactorBookScreen editionId={edition ?? null} onChoose={(editionId) => router.setParams({ edition: editionId })} />
  )
}
