import { Redirect, Slot, usePathname, useRouter, type Href } from 'expo-router'
import { FieldDoor } from '@/components/field/FieldDoor'
import { fieldEntries } from '@/components/field/fieldEntries'
import { useWaitingSheets } from '@/components/field/useWaitingSheets'
import { DemoStrip } from '@/components/session/DemoStrip'
import { deviceName } from '@/components/session/deviceSession'
import { FrameFoot } from '@/components/session/FrameFoot'
import { homeOf } from '@/components/session/homeOf'
import { sideEntries } from '@/components/session/sideEntries'
import { AppFrame } from '@/components/ui/AppFrame'
import { useMessages } from '@/components/ui/MessagesProvider'
import { FieldProvider } from '@/sync/react/FieldProvider'
import { useAccount, useSession } from '@/sync/react/SessionProvider'

export { FieldFault as ErrorBoundary } from '@/components/field/FieldFault'

export default function FieldLayout() {
  const { account } = useSession()
  if (!account) return <Redirect href="/sign-in" />
  if (!account.roles.includes('surveyor')) return <Redirect href={homeOf(account.roles) as Href} />
  return (
    <FieldProvider deviceName={deviceName()}>
      <Frame />
    </FieldProvider>
  )
}

function Frame() {
  const { t } = useMessages()
  const account = useAccount()
  const path = usePathname()
  const router = useRouter()
  const entries = fieldEntries(t, useWaitingSheets())
  const others = sideEntries(
    account.roles.filter((role) => role !== 'surveyor'),
    t,
  )
  return (
    <AppFrame
      entries={
        others.length === 0 ? entries : [...entries.map((entry) => ({ ...entry, group: t('nav.field') })), ...others]
      }
      currentPath={path.startsWith('/sheet/') ? '/street' : path}
      onNavigate={(href) => router.navigate(href as Href)}
      place={`${account.organisationName} · ${t('nav.field')}`}
      foot={<FrameFoot />}
      strip={account.isDemo ? <DemoStrip /> : undefined}
    >
      <FieldDoor>
        <Slot />
      </FieldDoor>
    </AppFrame>
  )
}
