import { SheetReviewScreen } from '@/components/review/SheetReviewScreen'

export default function SheetReviewRoute() {
  return <SheetReviewScreen />
}
