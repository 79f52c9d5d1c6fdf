import { useRouter, type Href } from 'expo-router'
import { useState } from 'react'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { TextField } from '@/components/ui/TextField'
import { useSessionStore } from '@/sync/react/SessionProvider'
import { deviceName } from './deviceSession'
import { homeOf } from './homeOf'
import { SessionFault } from './SessionFault'

/** Sign-in needs the network once; from then on the field side opens without it. */
export function SignInScreen() {
  const { t } = useMessages()
  const router = useRouter()
  const session = useSessionStore()
  const [email, setEmail] = useState('')
  const [password, setPassword] = useState('')
  const [isBusy, setBusy] = useState(false)
  const [error, setError] = useState<unknown>(null)

  const handleSignIn = async () => {
    setBusy(true)
    setError(null)
    try {
      const account = await session.signIn(email, password, deviceName())
      router.replace(homeOf(account.roles) as Href)
    } catch (fault) {
      setError(fault)
    } finally {
      setBusy(false)
    }
  }

  return (
    <Screen title={t('common.product')} subtitle={t('auth.oneLine')} width="form">
      <Panel title={t('auth.signIn')}>
        <TextField
          label={t('auth.email')}
          value={email}
          onChange={setEmail}
          autoComplete="email"
          keyboard="email-address"
        />
        <TextField
          label={t('auth.password')}
          value={password}
          onChange={setPassword}
          secure
          autoComplete="current-password"
          onSubmit={() => void handleSignIn()}
        />
        {error ? <SessionFault error={error} /> : null}
        <Button kind="primary" label={t('auth.signIn')} onPress={() => void handleSignIn()} busy={isBusy} />
        <Button kind="quiet" label={t('auth.forgotten')} onPress={() => router.navigate('/reset')} />
      </Panel>
    </Screen>
  )
}
