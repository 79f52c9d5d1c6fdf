import { ResetScreen } from '@/components/session/ResetScreen'

export default function ResetRoute() {
  return <ResetScreen />
}
