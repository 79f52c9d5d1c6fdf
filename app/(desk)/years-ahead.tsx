import { YearsAheadScreen } from '@/components/flows/YearsAheadScreen'

export default function YearsAheadRoute() {
  return <YearsAheadScreen />
}
