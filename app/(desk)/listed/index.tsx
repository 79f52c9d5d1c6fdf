import { useRouter, type Href } from 'expo-router'
import { ListedScreen } from '@/components/listed/ListedScreen'

export default function ListedRoute() {
  const router = useRouter()
  return <ListedScreen side="desk" onOpen={(listingId) => router.push(`/listed/${listingId}` as Href)} />
}
