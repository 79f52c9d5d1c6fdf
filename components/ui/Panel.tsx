import { useId, type ReactNode } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from './AppText'
import { useTheme } from './theme/ThemeProvider'
import { HEAD_RULE, RADIUS, SPACE, toneColour, type Tone } from './theme/tokens'
import { webOnly } from './web/webOnly'

interface PanelProps {
  readonly title?: string
  /** Short text at the right of the title ("41 of 118 buildings"). */
  readonly note?: string
  /** A control at the right of the title, instead of a note. */
  readonly action?: ReactNode
  /** Colour of the heavy rule at its head; ink when left out. */
  readonly tone?: Tone
  /** Level of the title, 2 when left out. */
  readonly level?: 2 | 3 | 4
  /** No padding, for a table or a map that reaches the edges. */
  readonly flush?: boolean
  /** Fills the height it is given. */
  readonly grow?: boolean
  readonly children?: ReactNode
}

/** A part of a screen under a heavy rule, like a view on a drawing sheet. */
export function Panel({ title, note, action, tone = 'ink', level = 2, flush, grow, children }: PanelProps) {
  const { colours } = useTheme()
  const titleId = useId()
  const hasHead = Boolean(title ?? note ?? action)
  return (
    <View
      {...(title ? { role: 'region' as const, 'aria-labelledby': titleId } : {})}
      {...webOnly({ dataSet: { panel: '' } })}
      style={[
        styles.panel,
        {
          backgroundColor: colours.panel,
          borderColor: colours.hairline,
          borderTopColor: tone === 'ink' ? colours.rule : toneColour(tone, colours),
        },
        grow && styles.grow,
      ]}
    >
      {hasHead ? <PanelHead title={title} note={note} action={action} level={level} titleId={titleId} /> : null}
      <View style={[flush ? styles.flush : styles.body, !hasHead && !flush && styles.headless, grow && styles.grow]}>
        {children}
      </View>
    </View>
  )
}

interface PanelHeadProps extends Pick<PanelProps, 'title' | 'note' | 'action' | 'level'> {
  readonly titleId: string
}

function PanelHead({ title, note, action, level, titleId }: PanelHeadProps) {
  return (
    <View style={styles.head}>
      <View style={styles.title}>
        {title ? (
          <AppText kind="heading" level={level} id={titleId}>
            {title}
          </AppText>
        ) : null}
      </View>
      {note ? (
        <AppText weight="medium" soft align="right" style={styles.note}>
          {note}
        </AppText>
      ) : null}
      {action}
    </View>
  )
}

const styles = StyleSheet.create({
  panel: { borderWidth: 1, borderTopWidth: HEAD_RULE, borderRadius: RADIUS },
  grow: { flexGrow: 1, flexShrink: 1, minHeight: 0 },
  head: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    columnGap: SPACE.medium,
    paddingHorizontal: SPACE.medium,
    paddingTop: SPACE.small + 2,
  },
  title: { flexGrow: 1, flexShrink: 1 },
  note: { flexShrink: 1, fontVariant: ['tabular-nums'] },
  body: { padding: SPACE.medium, paddingTop: SPACE.small, gap: SPACE.medium },
  headless: { paddingTop: SPACE.medium },
  flush: {},
})
