import { useLocalSearchParams, useRouter } from 'expo-router'
import { PublicationLoadsScreen } from '@/components/loads/PublicationLoadsScreen'

export default function PublicationLoadsRoute() {
  const { publicationId } = useLocalSearchParams<{ publicationId: string }>()
  const router = useRouter()
  return (
    <PublicationLoadsScreen
      key={publicationId}
      publicationId={publicationId}
      onBack={() => router.navigate('/loads-ahead')}
    />
  )
}
