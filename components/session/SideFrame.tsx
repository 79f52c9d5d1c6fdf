import { useQuery } from '@tanstack/react-query'
import { Redirect, usePathname, useRouter, type Href } from 'expo-router'
import type { ReactNode } from 'react'
import { AppFrame } from '@/components/ui/AppFrame'
import { useMessages } from '@/components/ui/MessagesProvider'
import { reviewQueue } from '@/shared/api/review'
import type { Role } from '@/shared/schemas/person'
import { useApi, useSession } from '@/sync/react/SessionProvider'
import { DemoStrip } from './DemoStrip'
import { FrameFoot } from './FrameFoot'
import { homeOf } from './homeOf'
import { sideEntries } from './sideEntries'

interface SideFrameProps {
  readonly role: Exclude<Role, 'surveyor'>
  readonly children: ReactNode
}

const SIDE = { planner: 'nav.desk', contractor: 'nav.yard', steward: 'nav.steward' } as const

/** Frame of desk, yard and steward: lets nobody in without the role. */
export function SideFrame({ role, children }: SideFrameProps) {
  const { account } = useSession()
  const { t } = useMessages()
  const path = usePathname()
  const router = useRouter()
  const api = useApi()
  const waiting = useQuery({
    queryKey: ['review', 'waiting'],
    queryFn: ({ signal }) => api.call(reviewQueue, { query: { state: 'handed-in', limit: 1 } }, signal),
    enabled: account?.roles.includes('planner') ?? false,
  })
  if (!account) return <Redirect href="/sign-in" />
  if (!account.roles.includes(role)) return <Redirect href={homeOf(account.roles) as Href} />
  return (
    <AppFrame
      entries={sideEntries(account.roles, t, waiting.data?.counts.handedIn ?? 0)}
      currentPath={path}
      onNavigate={(href) => router.navigate(href as Href)}
      place={`${account.organisationName} · ${t(SIDE[role])}`}
      foot={<FrameFoot />}
      hasFootOnPhone
      strip={account.isDemo ? <DemoStrip /> : undefined}
    >
      {children}
    </AppFrame>
  )
}
