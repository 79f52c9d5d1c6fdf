import { SignInScreen } from '@/components/session/SignInScreen'

export default function SignInRoute() {
  return <SignInScreen />
}
