import { useLocalSearchParams, useRouter } from 'expo-router'
import { useState } from 'react'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { TextField } from '@/components/ui/TextField'
import { askPasswordReset, confirmPasswordReset } from '@/shared/api/auth'
import { useApi } from '@/sync/react/SessionProvider'
import { SessionFault } from './SessionFault'

/** Asks for a reset link, or sets the new password when it is opened from one. */
export function ResetScreen() {
  const { t } = useMessages()
  const { token } = useLocalSearchParams<{ token?: string }>()
  return (
    <Screen title={t('auth.resetTitle')} width="form">
      <Panel title={token ? t('auth.newPassword') : t('auth.askLink')}>
        {token ? <NewPassword token={token} /> : <AskLink />}
      </Panel>
    </Screen>
  )
}

function AskLink() {
  const { t } = useMessages()
  const api = useApi()
  const router = useRouter()
  const [email, setEmail] = useState('')
  const [isSent, setSent] = useState(false)
  const [error, setError] = useState<unknown>(null)
  const handleAsk = () => api.call(askPasswordReset, { body: { email } }).then(() => setSent(true), setError)
  return (
    <>
      <TextField
        label={t('auth.email')}
        value={email}
        onChange={setEmail}
        autoComplete="email"
        keyboard="email-address"
      />
      {isSent ? <Notice tone="good" whatHappened={t('auth.linkSent')} /> : null}
      {error ? <SessionFault error={error} /> : null}
      <Button kind="primary" label={t('auth.sendLink')} onPress={() => void handleAsk()} />
      <Button kind="quiet" label={t('auth.backToSignIn')} onPress={() => router.navigate('/sign-in')} />
    </>
  )
}

function NewPassword({ token }: { readonly token: string }) {
  const { t } = useMessages()
  const api = useApi()
  const router = useRouter()
  const [password, setPassword] = useState('')
  const [error, setError] = useState<unknown>(null)
  const handleSet = () =>
    api.call(confirmPasswordReset, { body: { token, password } }).then(() => router.replace('/sign-in'), setError)
  return (
    <>
      <TextField
        label={t('auth.newPassword')}
        hint={t('auth.passwordHint')}
        value={password}
        onChange={setPassword}
        secure
        autoComplete="new-password"
      />
      {error ? <SessionFault error={error} /> : null}
      <Button kind="primary" label={t('auth.setPassword')} onPress={() => void handleSet()} />
    </>
  )
}
