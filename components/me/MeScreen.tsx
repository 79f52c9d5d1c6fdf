import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { CheckBox } from '@/components/ui/CheckBox'
import { Choice } from '@/components/ui/Choice'
import { useLanguageChoice } from '@/components/ui/LanguageProvider'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { useThemeChoice } from '@/components/ui/theme/ThemeProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import type { FieldStore } from '@/db/fieldStore.types'
import { isLanguage, LANGUAGES } from '@/shared/messages/languages'
import { useStored } from '@/sync/react/FieldProvider'
import { useAccount, useSession, useSessionStore } from '@/sync/react/SessionProvider'

interface MeScreenProps {
  readonly deviceName: string
  readonly onSignIn: () => void
}

const readBag = (store: FieldStore) => store.readBag()
const SPOKEN = Object.keys(LANGUAGES).filter(isLanguage)
const LOOKS = ['system', 'limewash', 'night'] as const

/** Account, device, look, language and units, and the way out that deletes nothing. */
export function MeScreen({ deviceName, onSignIn }: MeScreenProps) {
  const { t } = useMessages()
  const account = useAccount()
  const session = useSessionStore()
  const { mustSignInAgain } = useSession()
  const bag = useStored(readBag)
  const { look, isBrightSun, setLook, setBrightSun } = useThemeChoice()
  const { language, setLanguage } = useLanguageChoice()
  const waiting = [
    { key: 'signOutWaiting', count: (bag?.sheetCount ?? 0) + (bag?.startedCount ?? 0) },
    { key: 'signOutPhotos', count: bag?.photoCount ?? 0 },
    { key: 'signOutRefused', count: bag?.quarantined.length ?? 0 },
  ] as const
  return (
    <Screen title={t('me.title')} subtitle={account.name} width="form">
      {mustSignInAgain ? (
        <Notice
          tone="attention"
          whatHappened={t('me.sessionEnded')}
          action={<Button label={t('me.signInAgain')} onPress={onSignIn} />}
        />
      ) : null}
      <Panel title={t('me.account')}>
        <Fact name={t('me.name')} value={account.name} />
        <Fact name={t('me.email')} value={account.email} />
        <Fact name={t('me.organisation')} value={account.organisationName} />
        <Fact name={t('me.roles')} value={account.roles.map((role) => t(`vocabulary.role.${role}`)).join(', ')} />
      </Panel>
      <Panel title={t('me.look')}>
        <Choice
          label={t('common.theme.label')}
          value={look}
          onChange={setLook}
          options={LOOKS.map((value) => ({ value, label: t(`common.theme.${value}`) }))}
        />
        <CheckBox
          label={t('common.theme.brightSun')}
          hint={t('common.theme.brightSunHint')}
          checked={isBrightSun}
          onChange={setBrightSun}
        />
        <Choice
          label={t('me.language')}
          value={language}
          onChange={setLanguage}
          options={SPOKEN.map((value) => ({ value, label: LANGUAGES[value].ownName }))}
        />
        <Fact name={t('me.units')} value={t('me.unitsMetric')} />
      </Panel>
      <Panel title={t('me.device')}>
        <Fact name={t('me.device')} value={deviceName} />
        <Fact name={t('me.deviceId')} value={session.deviceId()} />
      </Panel>
      <Panel title={t('me.signOut')}>
        {waiting
          .filter(({ count }) => count > 0)
          .map(({ key, count }) => (
            <AppText key={key} weight="semibold">
              {t(`me.${key}`, { count })}
            </AppText>
          ))}
        <AppText soft>{t('me.signOutKeeps')}</AppText>
        <Button kind="secondary" icon="out" label={t('me.signOut')} onPress={() => void session.signOut()} />
      </Panel>
    </Screen>
  )
}

function Fact({ name, value }: { readonly name: string; readonly value: string }) {
  return (
    <View style={styles.fact}>
      <AppText soft>{name}</AppText>
      <AppText style={styles.value} align="right">
        {value}
      </AppText>
    </View>
  )
}

const styles = StyleSheet.create({
  fact: { flexDirection: 'row', justifyContent: 'space-between', gap: SPACE.large },
  value: { flexShrink: 1 },
})
