import { RoundScreen } from '@/components/rounds/RoundScreen'

export default function RoundRoute() {
  return <RoundScreen />
}
