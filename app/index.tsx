import { Redirect, type Href } from 'expo-router'
import { homeOf } from '@/components/session/homeOf'
import { useSession } from '@/sync/react/SessionProvider'

export default function StartRoute() {
  const { account } = useSession()
  return <Redirect href={(account ? homeOf(account.roles) : '/sign-in') as Href} />
}
