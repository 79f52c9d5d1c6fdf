import { ReviewScreen } from '@/components/review/ReviewScreen'

export default function ReviewRoute() {
  return <ReviewScreen />
}
