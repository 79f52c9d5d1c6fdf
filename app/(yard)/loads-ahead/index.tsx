import { useRouter } from 'expo-router'
import { LoadsAheadScreen } from '@/components/loads/LoadsAheadScreen'

export default function LoadsAheadRoute() {
  const router = useRouter()
  return <LoadsAheadScreen onOpen={(publicationId) => router.push(`/loads-ahead/${publicationId}`)} />
}
