import { useState, type ReactNode } from 'react'
import { Pressable, ScrollView, StyleSheet, View } from 'react-native'
import type { AppFrameProps, NavEntry } from './AppFrame.types'
import { AppText } from './AppText'
import { currentEntry } from './currentEntry'
import { Dialog } from './Dialog'
import { useMessages } from './MessagesProvider'
import { SideLink, TabLink } from './NavLink'
import { useTheme } from './theme/ThemeProvider'
import { useWide } from './theme/useWide'
import { SPACE } from './theme/tokens'
import { focusMain } from './web/focusMain'
import { webOnly } from './web/webOnly'

/** More tabs than these do not fit under a thumb; the rest lie behind the last one. */
const MOST_TABS = 5

/**
 * The frame of the app: navigation as a side column on a desk, as tabs at the foot of a phone. A `Screen` inside
 * brings the header and the main part.
 */
export function AppFrame(props: AppFrameProps) {
  const { strip, children } = props
  const { colours } = useTheme()
  const isWide = useWide()
  return (
    <View
      style={[styles.app, isWide && styles.appWide, { backgroundColor: colours.ground }]}
      {...webOnly({ dataSet: { printFlow: '' } })}
    >
      <SkipLink />
      {isWide ? <SideColumn {...props} /> : null}
      <View style={styles.content} {...webOnly({ dataSet: { printFlow: '' } })}>
        {strip}
        {children}
      </View>
      {isWide ? null : <TabBar {...props} />}
    </View>
  )
}

function SkipLink() {
  const { colours } = useTheme()
  const { t } = useMessages()
  return (
    <Pressable
      role="link"
      onPress={(event) => {
        event.preventDefault()
        focusMain()
      }}
      {...webOnly({ href: '#main', dataSet: { skipLink: '', printHide: '' } })}
      style={[styles.skip, { backgroundColor: colours.chosen }]}
    >
      <AppText weight="semibold" style={{ color: colours.onChosen }}>
        {t('common.skipToContent')}
      </AppText>
    </Pressable>
  )
}

function SideColumn({ entries, currentPath, onNavigate, place, foot }: AppFrameProps) {
  const { colours } = useTheme()
  const { t } = useMessages()
  const current = currentEntry(entries, currentPath)
  return (
    <View
      role="navigation"
      aria-label={t('common.mainNavigation')}
      style={[styles.side, { backgroundColor: colours.panel, borderColor: colours.rule }]}
    >
      <View style={styles.brand}>
        <AppText size="heading" weight="bold">
          {t('common.product')}
        </AppText>
        {place ? <AppText soft>{place}</AppText> : null}
      </View>
      <ScrollView style={styles.sideScroll}>
        <Groups entries={entries}>
          {(entry) => <SideLink key={entry.href} entry={entry} isCurrent={entry === current} onNavigate={onNavigate} />}
        </Groups>
      </ScrollView>
      {foot ? <View style={[styles.sideFoot, { borderColor: colours.hairline }]}>{foot}</View> : null}
    </View>
  )
}

function TabBar({ entries, currentPath, onNavigate, foot, hasFootOnPhone = false }: AppFrameProps) {
  const { colours } = useTheme()
  const { t } = useMessages()
  const [isMoreOpen, setIsMoreOpen] = useState(false)
  const current = currentEntry(entries, currentPath)
  const fits = entries.length + (hasFootOnPhone ? 1 : 0) <= MOST_TABS
  const hasMore = !fits || hasFootOnPhone
  const tabs = fits ? entries : entries.slice(0, MOST_TABS - 1)
  const isBehindMore = current !== undefined && !tabs.includes(current)
  const more: NavEntry = { href: '#more', label: t('common.more'), icon: 'list' }
  return (
    <View
      role="navigation"
      aria-label={t('common.mainNavigation')}
      style={[
        styles.tabs,
        { backgroundColor: colours.panel, borderColor: colours.rule },
        webOnly({ paddingBottom: 'env(safe-area-inset-bottom)' }),
      ]}
    >
      {tabs.map((entry) => (
        <TabLink key={entry.href} entry={entry} isCurrent={entry === current} onNavigate={onNavigate} />
      ))}
      {hasMore ? <TabLink entry={more} isCurrent={isBehindMore} onNavigate={() => setIsMoreOpen(true)} /> : null}
      <Dialog title={t('common.product')} isOpen={isMoreOpen} onClose={() => setIsMoreOpen(false)}>
        <Groups entries={entries}>
          {(entry) => (
            <SideLink
              key={entry.href}
              entry={entry}
              isCurrent={entry === current}
              onNavigate={(href) => {
                setIsMoreOpen(false)
                onNavigate(href)
              }}
            />
          )}
        </Groups>
        {hasFootOnPhone ? foot : null}
      </Dialog>
    </View>
  )
}

interface GroupsProps {
  readonly entries: readonly NavEntry[]
  readonly children: (entry: NavEntry) => ReactNode
}

function Groups({ entries, children }: GroupsProps) {
  const groups = [...new Set(entries.map(({ group }) => group ?? ''))]
  return groups.map((group) => (
    <View key={group} style={styles.group}>
      {groups.length > 1 && group !== '' ? (
        <AppText kind="label" weight="semibold" style={styles.groupName}>
          {group}
        </AppText>
      ) : null}
      {entries.filter((entry) => (entry.group ?? '') === group).map(children)}
    </View>
  ))
}

const SIDE_WIDTH = 208

const styles = StyleSheet.create({
  app: { flex: 1, minHeight: 0 },
  appWide: { flexDirection: 'row' },
  content: { flex: 1, minWidth: 0, minHeight: 0 },
  skip: {
    position: 'absolute',
    top: 0,
    left: 0,
    zIndex: 10,
    minHeight: 48,
    justifyContent: 'center',
    paddingHorizontal: SPACE.large,
  },
  side: { width: SIDE_WIDTH, borderRightWidth: 3 },
  brand: { paddingHorizontal: SPACE.large, paddingTop: SPACE.large, paddingBottom: SPACE.medium },
  sideScroll: { flexGrow: 1, flexShrink: 1 },
  sideFoot: { borderTopWidth: 1, padding: SPACE.large, gap: SPACE.small },
  group: { paddingBottom: SPACE.medium },
  groupName: { paddingHorizontal: SPACE.large, paddingBottom: SPACE.tight },
  tabs: { flexDirection: 'row', borderTopWidth: 3 },
})
