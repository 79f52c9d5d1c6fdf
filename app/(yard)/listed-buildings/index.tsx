import { useRouter, type Href } from 'expo-router'
import { ListedScreen } from '@/components/listed/ListedScreen'

export default function YardListedRoute() {
  const router = useRouter()
  return <ListedScreen side="yard" onOpen={(listingId) => router.push(`/listed-buildings/${listingId}` as Href)} />
}
