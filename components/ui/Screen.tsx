import { useEffect, type ReactNode } from 'react'
import { ScrollView, StyleSheet, useWindowDimensions, View } from 'react-native'
import { AppText } from './AppText'
import { IconButton } from './IconButton'
import { useMessages } from './MessagesProvider'
import { useTheme } from './theme/ThemeProvider'
import { useWide } from './theme/useWide'
import { SPACE } from './theme/tokens'
import { setDocumentTitle } from './web/setDocumentTitle'
import { webOnly } from './web/webOnly'

/** Widest a screen's content becomes [px]: a form, a report, or whatever the window gives. */
const WIDTHS = { form: 720, report: 1120, full: undefined } as const

/** From this width of the window on, a column at the right leaves enough for the content [px]. */
const ASIDE_FROM_PX = 1100

interface ScreenProps {
  readonly title: string
  /** Under the title: "Beat 4 · Tuesday 13 October". */
  readonly subtitle?: string
  /** At the right of the header: a badge, a button. */
  readonly right?: ReactNode
  readonly onBack?: () => void
  /** `form` 720 px, `report` 1120 px, `full` all there is; `report` when left out. */
  readonly width?: keyof typeof WIDTHS
  /** Neither scrolls nor pads: the content takes the height itself (maps, lists). */
  readonly fill?: boolean
  /** Buttons that stay in sight at the foot; the content ends above them. */
  readonly footer?: ReactNode
  /** Column at the right on a desk, under the content on a phone. */
  readonly aside?: ReactNode
  readonly children: ReactNode
}

/** One screen: header with its title, main part, and at the foot what is always at hand. */
export function Screen(props: ScreenProps) {
  const { title, width = 'report', footer, aside } = props
  const { colours } = useTheme()
  const { width: windowPx } = useWindowDimensions()
  const isBeside = windowPx >= ASIDE_FROM_PX
  useEffect(() => setDocumentTitle(title), [title])
  return (
    <View style={styles.screen} {...webOnly({ dataSet: { printFlow: '' } })}>
      <Header {...props} />
      <View
        role="main"
        {...webOnly({ id: 'main', tabIndex: -1, dataSet: { printFlow: '', insetFocus: '' } })}
        style={[styles.main, isBeside && aside ? styles.row : null]}
      >
        <Body {...props} aside={isBeside ? undefined : aside} />
        {isBeside && aside ? (
          <ScrollView
            style={[styles.aside, { borderColor: colours.rule }]}
            contentContainerStyle={styles.asideStack}
            {...scrolls}
          >
            {aside}
          </ScrollView>
        ) : null}
      </View>
      {footer ? (
        <View
          style={[styles.footer, { backgroundColor: colours.ground, borderColor: colours.rule }]}
          {...webOnly({ dataSet: { printHide: '' } })}
        >
          <View style={[styles.footerRow, { maxWidth: WIDTHS[width] }]}>{footer}</View>
        </View>
      ) : null}
    </View>
  )
}

/** The content, and under it what has no room beside it. */
function Body({ width = 'report', fill = false, aside, children }: ScreenProps) {
  const { colours } = useTheme()
  const isWide = useWide()
  if (fill) {
    return (
      <>
        <View style={styles.fill}>{children}</View>
        {aside ? (
          <ScrollView
            style={[styles.asideUnder, { borderColor: colours.rule }]}
            contentContainerStyle={styles.asideStack}
            {...scrolls}
          >
            {aside}
          </ScrollView>
        ) : null}
      </>
    )
  }
  return (
    <ScrollView style={styles.scroll} {...scrolls}>
      <View style={[styles.stack, { maxWidth: WIDTHS[width], padding: isWide ? SPACE.wide : SPACE.medium }]}>
        {children}
        {aside}
      </View>
    </ScrollView>
  )
}

/** What scrolls can be reached and scrolled by the keyboard, and unrolls on paper. */
const scrolls = webOnly({ tabIndex: 0, dataSet: { printFlow: '', insetFocus: '' } })

function Header({ title, subtitle, right, onBack }: ScreenProps) {
  const { colours } = useTheme()
  const { t } = useMessages()
  const isWide = useWide()
  return (
    <View
      role="banner"
      style={[
        styles.header,
        isWide && styles.headerWide,
        { borderColor: colours.rule, backgroundColor: colours.ground },
        webOnly({ paddingTop: `max(${SPACE.large}px, env(safe-area-inset-top))` }),
      ]}
    >
      {onBack ? (
        <View style={styles.back}>
          <IconButton icon="back" label={t('common.back')} onPress={onBack} />
        </View>
      ) : null}
      <View style={styles.titles}>
        <AppText kind="title" size={isWide ? 'figure' : 'heading'}>
          {title}
        </AppText>
        {subtitle ? <AppText soft>{subtitle}</AppText> : null}
      </View>
      {right ? <View style={styles.right}>{right}</View> : null}
    </View>
  )
}

const styles = StyleSheet.create({
  screen: { flex: 1, minHeight: 0 },
  header: {
    flexDirection: 'row',
    alignItems: 'flex-start',
    gap: SPACE.medium,
    borderBottomWidth: 3,
    paddingHorizontal: SPACE.large,
    paddingTop: SPACE.large,
    paddingBottom: SPACE.medium,
  },
  headerWide: { paddingHorizontal: SPACE.wide },
  back: { marginLeft: -SPACE.medium, marginVertical: -SPACE.tight },
  titles: { flexGrow: 1, flexShrink: 1 },
  right: { flexDirection: 'row', alignItems: 'center', gap: SPACE.small, flexShrink: 0 },
  main: { flex: 1, minHeight: 0 },
  row: { flexDirection: 'row' },
  scroll: { flex: 1 },
  stack: { width: '100%', gap: SPACE.medium },
  fill: { flex: 1, minHeight: 0, minWidth: 0 },
  aside: { flexGrow: 0, flexShrink: 0, flexBasis: 380, borderLeftWidth: 3 },
  asideUnder: { flexGrow: 0, flexShrink: 0, maxHeight: '48%', borderTopWidth: 3 },
  asideStack: { padding: SPACE.large, gap: SPACE.large },
  footer: { borderTopWidth: 1.5, paddingHorizontal: SPACE.large, paddingVertical: SPACE.medium },
  footerRow: { flexDirection: 'row', gap: SPACE.medium, width: '100%' },
})
