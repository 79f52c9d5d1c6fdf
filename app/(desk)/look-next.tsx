import { LookNextScreen } from '@/components/nextLook/LookNextScreen'

export default function LookNextRoute() {
  return <LookNextScreen />
}
