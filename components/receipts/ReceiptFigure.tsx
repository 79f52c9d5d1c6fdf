import { useRouter } from 'expo-router'
import { Pressable, StyleSheet } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { keepInApp } from '@/components/ui/keepInApp'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { TARGET } from '@/components/ui/theme/tokens'
import { webOnly } from '@/components/ui/web/webOnly'

interface ReceiptFigureProps {
  /** The figure as it is written at the head of a panel. */
  readonly text: string
  /** What it is a figure of, for screen readers. */
  readonly what: string
  readonly href: string
}

/** The figure of a panel, which opens its receipt when it is touched. */
export function ReceiptFigure({ text, what, href }: ReceiptFigureProps) {
  const { t } = useMessages()
  const router = useRouter()
  const { colours } = useTheme()
  return (
    <Pressable
      role="link"
      aria-label={`${text}. ${t('receipts.open', { what })}`}
      onPress={(event) => {
        if (keepInApp(event)) router.push(href)
      }}
      {...webOnly({ href })}
      style={styles.link}
    >
      <AppText kind="figure" size="figure" style={[styles.figure, { textDecorationColor: colours.action }]}>
        {text}
      </AppText>
    </Pressable>
  )
}

const styles = StyleSheet.create({
  link: { alignSelf: 'flex-start', minHeight: TARGET, justifyContent: 'center' },
  figure: { textDecorationLine: 'underline', textDecorationStyle: 'dotted' },
})
