import { useId, type ReactNode } from 'react'
import { Modal, Pressable, ScrollView, StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { IconButton } from './IconButton'
import { useMessages } from './MessagesProvider'
import { useTheme } from './theme/ThemeProvider'
import { useWide } from './theme/useWide'
import { HEAD_RULE, RADIUS, SPACE, toneColour, type Tone } from './theme/tokens'
import { webOnly } from './web/webOnly'

interface DialogProps {
  readonly title: string
  readonly isOpen: boolean
  /** Escape, the cross and a press beside the dialog. */
  readonly onClose: () => void
  readonly children: ReactNode
  /** Buttons at the foot, the one to press last. */
  readonly actions?: ReactNode
  readonly tone?: Tone
  /** Widest it becomes on a desk [px]; 560 when left out. */
  readonly maxWidth?: number
}

/** A question or a closer look over the page. Focus stays in it while it is open and goes back afterwards. */
export function Dialog({ title, isOpen, onClose, children, actions, tone = 'ink', maxWidth = 560 }: DialogProps) {
  const { colours } = useTheme()
  const { t } = useMessages()
  const isWide = useWide()
  const titleId = useId()
  return (
    <Modal
      visible={isOpen}
      transparent
      onRequestClose={onClose}
      animationType="none"
      {...webOnly({ 'aria-labelledby': titleId })}
    >
      <View style={[styles.page, isWide ? styles.pageWide : styles.pagePhone]}>
        <Pressable
          onPress={onClose}
          {...webOnly({ tabIndex: -1, 'aria-hidden': true })}
          style={[styles.veil, { backgroundColor: colours.veil }]}
        />
        <View
          style={[
            styles.dialog,
            isWide && { maxWidth },
            {
              backgroundColor: colours.panel,
              borderColor: colours.rule,
              borderTopColor: tone === 'ink' ? colours.rule : toneColour(tone, colours),
            },
          ]}
        >
          <View style={styles.head}>
            <View style={styles.title}>
              <AppText kind="title" level={2} id={titleId}>
                {title}
              </AppText>
            </View>
            <IconButton icon="close" label={t('common.close')} onPress={onClose} />
          </View>
          <ScrollView style={styles.scroll} contentContainerStyle={styles.body}>
            {children}
          </ScrollView>
          {actions ? <View style={[styles.actions, { borderColor: colours.hairline }]}>{actions}</View> : null}
        </View>
      </View>
    </Modal>
  )
}

const styles = StyleSheet.create({
  page: { flex: 1, alignItems: 'center' },
  pageWide: { justifyContent: 'center', padding: SPACE.huge },
  pagePhone: { justifyContent: 'flex-end' },
  veil: { position: 'absolute', top: 0, right: 0, bottom: 0, left: 0 },
  dialog: { width: '100%', maxHeight: '92%', borderWidth: 1, borderTopWidth: HEAD_RULE, borderRadius: RADIUS },
  head: { flexDirection: 'row', alignItems: 'flex-start', paddingLeft: SPACE.large, paddingTop: SPACE.tight },
  title: { flexGrow: 1, flexShrink: 1, paddingTop: SPACE.small + 2 },
  scroll: { flexGrow: 0, flexShrink: 1 },
  body: { paddingHorizontal: SPACE.large, paddingBottom: SPACE.large, gap: SPACE.medium },
  actions: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    justifyContent: 'flex-end',
    gap: SPACE.small,
    borderTopWidth: 1,
    padding: SPACE.medium,
  },
})
