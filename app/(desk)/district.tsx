import { DistrictScreen } from '@/components/district/DistrictScreen'

export default function DistrictRoute() {
  return <DistrictScreen />
}
