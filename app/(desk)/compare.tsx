import { CompareScreen } from '@/components/comparison/CompareScreen'

export default function CompareRoute() {
  return <CompareScreen />
}
