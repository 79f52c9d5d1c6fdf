import { JoinScreen } from '@/components/session/JoinScreen'

export default function JoinRoute() {
  return <JoinScreen />
}
