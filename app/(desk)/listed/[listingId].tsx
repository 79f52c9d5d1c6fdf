import { useLocalSearchParams, useRouter, type Href } from 'expo-router'
import { ListingPageScreen } from '@/components/listed/ListingPageScreen'

export default function ListedPageRoute() {
  const { listingId } = useLocalSearchParams<{ listingId: string }>()
  const router = useRouter()
  return (
    <ListingPageScreen
      key={listingId}
      side="desk"
      listingId={listingId}
      onBack={() => router.navigate('/listed' as Href)}
    />
  )
}
