import { useQuery } from '@tanstack/react-query'
import { useLocalSearchParams, useRouter, type Href } from 'expo-router'
import { useState } from 'react'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Progress } from '@/components/ui/Progress'
import { Screen } from '@/components/ui/Screen'
import { TextField } from '@/components/ui/TextField'
import { acceptInvitation, readInvitation } from '@/shared/api/auth'
import { useApi, useSessionStore } from '@/sync/react/SessionProvider'
import { deviceName } from './deviceSession'
import { homeOf } from './homeOf'
import { SessionFault } from './SessionFault'

/** What an invitation offers, and the password that accepts it. */
export function JoinScreen() {
  const { t } = useMessages()
  const { invitation: token } = useLocalSearchParams<{ invitation: string }>()
  const api = useApi()
  const offer = useQuery({
    queryKey: ['invitation', token],
    queryFn: () => api.call(readInvitation, { params: { token } }),
    retry: false,
  })
  return (
    <Screen title={t('auth.joinTitle')} subtitle={offer.data?.organisationName} width="form">
      <Panel title={t('auth.welcome')}>
        {offer.isPending ? <Progress label={t('common.loading')} share={null} /> : null}
        {offer.error ? <SessionFault error={offer.error} /> : null}
        {offer.data ? <Accept token={token} offered={offer.data.name} email={offer.data.email} /> : null}
      </Panel>
    </Screen>
  )
}

function Accept({
  token,
  offered,
  email,
}: {
  readonly token: string
  readonly offered: string
  readonly email: string
}) {
  const { t } = useMessages()
  const router = useRouter()
  const session = useSessionStore()
  const [name, setName] = useState(offered)
  const [password, setPassword] = useState('')
  const [error, setError] = useState<unknown>(null)
  const handleJoin = async () => {
    try {
      const device = { deviceId: session.deviceId(), name: deviceName() }
      const account = session.adopt(
        await session.api.call(acceptInvitation, { params: { token }, body: { name, password, device } }),
      )
      router.replace(homeOf(account.roles) as Href)
    } catch (fault) {
      setError(fault)
    }
  }
  return (
    <>
      <AppText>{t('auth.joinAs', { email })}</AppText>
      <TextField label={t('auth.name')} value={name} onChange={setName} autoComplete="name" />
      <TextField
        label={t('auth.password')}
        hint={t('auth.passwordHint')}
        value={password}
        onChange={setPassword}
        secure
        autoComplete="new-password"
      />
      {error ? <SessionFault error={error} /> : null}
      <Button kind="primary" label={t('auth.join')} onPress={() => void handleJoin()} />
    </>
  )
}
