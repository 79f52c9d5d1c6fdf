import { View, StyleSheet } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useLanguageChoice } from '@/components/ui/LanguageProvider'
import { useMessages } from '@/components/ui/MessagesProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import { useThemeChoice } from '@/components/ui/theme/ThemeProvider'
import { LANGUAGES } from '@/shared/messages/languages'
import { useAccount, useSessionStore } from '@/sync/react/SessionProvider'

/** Foot of the side column: who is signed in, the look, the other language, the way out. */
export function FrameFoot() {
  const { t } = useMessages()
  const { name } = useAccount()
  const session = useSessionStore()
  const { look, setLook } = useThemeChoice()
  const isNight = look === 'night'
  const { language, setLanguage } = useLanguageChoice()
  const other = language === 'en' ? 'de' : 'en'
  return (
    <View style={styles.foot}>
      <AppText kind="label" soft>
        {name}
      </AppText>
      <Button
        kind="quiet"
        label={isNight ? t('auth.dayLook') : t('auth.nightLook')}
        onPress={() => setLook(isNight ? 'limewash' : 'night')}
      />
      <Button kind="quiet" label={LANGUAGES[other].ownName} onPress={() => setLanguage(other)} />
      <Button kind="quiet" label={t('auth.signOut')} onPress={() => void session.signOut()} />
    </View>
  )
}

const styles = StyleSheet.create({ foot: { gap: SPACE.tight } })
