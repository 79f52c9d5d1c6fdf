import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE } from '@/components/ui/theme/tokens'

/** Says on every screen of the demo that nothing in it is real. */
export function DemoStrip() {
  const { t } = useMessages()
  const { colours } = useTheme()
  return (
    <View
      role="complementary"
      aria-label={t('common.demo')}
      style={[styles.strip, { borderBottomColor: colours.hairline }]}
    >
      <AppText kind="label" soft>
        {t('auth.demoStrip')}
      </AppText>
    </View>
  )
}

const styles = StyleSheet.create({
  strip: { paddingHorizontal: SPACE.large, paddingVertical: SPACE.tight, borderBottomWidth: 1 },
})
