import { useState, type ReactNode } from 'react'
import { StyleSheet, View } from 'react-native'
import Svg, { Rect } from 'react-native-svg'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { IconButton } from '@/components/ui/IconButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import { useWide } from '@/components/ui/theme/useWide'

/** One line of the map's legend: a mark (a `Swatch`) or a colour, and what it means. */
export interface MapLegendEntry {
  readonly key: string
  readonly label: string
  readonly colour?: string
  readonly mark?: ReactNode
}

interface MapLegendProps {
  /** What is painted: "coming down 2027–2036, t per m²". */
  readonly title: string
  readonly entries: readonly MapLegendEntry[]
  readonly note?: string
}

/** What the paint of a map means, on a small panel over it; on a phone behind a button, so that the map stays free. */
export function MapLegend({ title, entries, note }: MapLegendProps) {
  const { colours } = useTheme()
  const { t } = useMessages()
  const isWide = useWide()
  const [isOpen, setIsOpen] = useState(false)
  if (!isWide && !isOpen) {
    return <Button icon="list" label={t('common.map.legend')} expanded={false} onPress={() => setIsOpen(true)} />
  }
  return (
    <Panel
      action={
        isWide ? null : <IconButton icon="close" label={t('common.map.closeLegend')} onPress={() => setIsOpen(false)} />
      }
      title={title}
    >
      <View role="list" aria-label={t('common.map.legend')} style={styles.list}>
        {entries.map(({ key, label, colour, mark }) => (
          <View key={key} role="listitem" style={styles.entry}>
            {mark ?? (
              <Svg width={22} height={16} aria-hidden>
                <Rect x={0.5} y={0.5} width={21} height={15} fill={colour ?? colours.panel} stroke={colours.rule} />
              </Svg>
            )}
            <AppText kind="number">{label}</AppText>
          </View>
        ))}
      </View>
      {note ? (
        <AppText kind="label" weight="regular">
          {note}
        </AppText>
      ) : null}
    </Panel>
  )
}

const styles = StyleSheet.create({
  list: { gap: SPACE.tight },
  entry: { flexDirection: 'row', alignItems: 'center', gap: SPACE.small },
})
