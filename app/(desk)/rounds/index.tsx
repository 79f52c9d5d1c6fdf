import { RoundsScreen } from '@/components/rounds/RoundsScreen'

export default function RoundsRoute() {
  return <RoundsScreen />
}
