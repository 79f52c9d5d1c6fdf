import { useLocalSearchParams, useRouter, type Href } from 'expo-router'
import { ListingPageScreen } from '@/components/listed/ListingPageScreen'

export default function YardListedPageRoute() {
  const { listingId } = useLocalSearchParams<{ listingId: string }>()
  const router = useRouter()
  return (
    <ListingPageScreen
      key={listingId}
      side="yard"
      listingId={listingId}
      onBack={() => router.navigate('/listed-buildings' as Href)}
    />
  )
}
