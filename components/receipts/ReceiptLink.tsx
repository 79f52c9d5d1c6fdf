import { useRouter } from 'expo-router'
import { Pressable, StyleSheet } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { keepInApp } from '@/components/ui/keepInApp'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import { webOnly } from '@/components/ui/web/webOnly'

interface ReceiptLinkProps {
  /** The figure as it is written. */
  readonly text: string
  /** What it is a figure of, for screen readers: "timber standing". */
  readonly what: string
  readonly href: string
  readonly bold?: boolean
}

/** A figure that opens its receipt when it is touched. */
export function ReceiptLink({ text, what, href, bold = false }: ReceiptLinkProps) {
  const { t } = useMessages()
  const router = useRouter()
  const { colours } = useTheme()
  return (
    <Pressable
      role="link"
      aria-label={`${text}. ${t('receipts.open', { what })}`}
      onPress={(event) => {
        // the row around it may open something of its own
        event.stopPropagation()
        if (keepInApp(event)) router.push(href)
      }}
      {...webOnly({ href, dataSet: { insetFocus: '' } })}
      style={styles.link}
    >
      <AppText
        kind="number"
        align="right"
        weight={bold ? 'semibold' : undefined}
        style={[styles.figure, { textDecorationColor: colours.action }]}
      >
        {text}
      </AppText>
    </Pressable>
  )
}

const styles = StyleSheet.create({
  link: {
    justifyContent: 'center',
    minHeight: 40,
    marginVertical: -SPACE.small,
    marginHorizontal: -SPACE.small,
    paddingHorizontal: SPACE.small,
  },
  figure: { textDecorationLine: 'underline', textDecorationStyle: 'dotted' },
})
