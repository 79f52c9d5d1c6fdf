import { useRouter } from 'expo-router'
import { deviceName } from '@/components/session/deviceSession'
import { MeScreen } from '@/components/me/MeScreen'

export default function MeRoute() {
  const router = useRouter()
  return <MeScreen deviceName={deviceName()} onSignIn={() => router.push('/sign-in')} />
}
