import { Pressable, StyleSheet, View } from 'react-native'
import type { NavEntry } from './AppFrame.types'
import { AppText } from './AppText'
import { keepInApp } from './keepInApp'
import { Icon } from './Icon'
import { useMessages } from './MessagesProvider'
import { useTheme } from './theme/ThemeProvider'
import { HEAD_RULE, SPACE, TARGET } from './theme/tokens'
import { webOnly } from './web/webOnly'

interface NavLinkProps {
  readonly entry: NavEntry
  readonly isCurrent: boolean
  readonly onNavigate: (href: string) => void
}

function useLinkProps({ entry, isCurrent, onNavigate }: NavLinkProps) {
  const { t } = useMessages()
  const { href, label, badge = 0 } = entry
  return {
    role: 'link' as const,
    'aria-label': badge > 0 ? t('common.navigationBadge', { label, count: badge }) : label,
    onPress: (event: Parameters<typeof keepInApp>[0]) => {
      if (keepInApp(event)) onNavigate(href)
    },
    ...webOnly({
      href,
      'aria-current': isCurrent ? 'page' : undefined,
      dataSet: { insetFocus: '', motion: '', ...(isCurrent ? {} : { hover: '' }) },
    }),
  }
}

/** A tab at the foot of a phone: drawing, word, and a bar of oxide over the current one. */
export function TabLink(props: NavLinkProps) {
  const { entry, isCurrent } = props
  const { colours } = useTheme()
  const colour = isCurrent ? colours.action : colours.inkSoft
  return (
    <Pressable {...useLinkProps(props)} style={styles.tab}>
      <View style={[styles.tabBar, { backgroundColor: isCurrent ? colours.action : 'transparent' }]} />
      <Icon name={entry.icon} colour={colour} />
      <AppText kind="label" weight="semibold" lines={1} style={{ color: colour }}>
        {withBadge(entry)}
      </AppText>
    </Pressable>
  )
}

/** A line of the side column: the current one is filled with slate. */
export function SideLink(props: NavLinkProps) {
  const { entry, isCurrent } = props
  const { colours } = useTheme()
  return (
    <Pressable {...useLinkProps(props)} style={[styles.side, isCurrent && { backgroundColor: colours.chosen }]}>
      <AppText kind="body" weight="semibold" style={{ color: isCurrent ? colours.onChosen : colours.ink }}>
        {withBadge(entry)}
      </AppText>
    </Pressable>
  )
}

function withBadge({ label, badge = 0 }: NavEntry): string {
  return badge > 0 ? `${label} · ${badge}` : label
}

const styles = StyleSheet.create({
  tab: {
    flex: 1,
    minHeight: 60,
    alignItems: 'center',
    justifyContent: 'center',
    gap: SPACE.hair,
    paddingBottom: SPACE.small,
    paddingTop: SPACE.medium,
  },
  tabBar: { position: 'absolute', top: 0, left: 0, right: 0, height: HEAD_RULE },
  side: { minHeight: TARGET, justifyContent: 'center', paddingHorizontal: SPACE.large },
})
