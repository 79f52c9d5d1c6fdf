import { DrawDistrictScreen } from '@/components/rounds/DrawDistrictScreen'

export default function DrawDistrictRoute() {
  return <DrawDistrictScreen />
}
