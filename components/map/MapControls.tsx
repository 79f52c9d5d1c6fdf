import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { IconButton } from '@/components/ui/IconButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import { webOnly } from '@/components/ui/web/webOnly'

interface MapButtonsProps {
  readonly onZoom: (steps: 1 | -1) => void
  readonly onFit?: () => void
  readonly onLocate?: () => void
  readonly onDraw?: () => void
}

/** What the fingers do on a map, as buttons under the thumb. */
export function MapButtons({ onZoom, onFit, onLocate, onDraw }: MapButtonsProps) {
  const { t } = useMessages()
  return (
    <View style={styles.buttons} {...webOnly({ dataSet: { printHide: '' } })}>
      {onDraw ? <IconButton framed icon="draw" label={t('common.map.draw')} onPress={onDraw} /> : null}
      {onLocate ? <IconButton framed icon="locate" label={t('common.map.locate')} onPress={onLocate} /> : null}
      {onFit ? <IconButton framed icon="fit" label={t('common.map.fit')} onPress={onFit} /> : null}
      <View>
        <IconButton framed icon="plus" label={t('common.map.zoomIn')} onPress={() => onZoom(1)} />
        <View style={styles.joined}>
          <IconButton framed icon="minus" label={t('common.map.zoomOut')} onPress={() => onZoom(-1)} />
        </View>
      </View>
    </View>
  )
}

interface DrawBarProps {
  readonly cornerCount: number
  readonly onCorner: () => void
  readonly onUndo: () => void
  readonly onDone: () => void
  readonly onCancel: () => void
}

/** Stands over the map while an area is drawn. */
export function DrawBar({ cornerCount, onCorner, onUndo, onDone, onCancel }: DrawBarProps) {
  const { t } = useMessages()
  return (
    <View style={styles.bar}>
      <Panel tone="action" title={t('common.map.draw')}>
        <View role="status">
          <AppText>
            {cornerCount === 0 ? t('common.map.drawHint') : t('common.map.drawCorners', { count: cornerCount })}
          </AppText>
        </View>
        <View style={styles.row}>
          <Button kind="primary" label={t('common.map.drawDone')} disabled={cornerCount < 3} onPress={onDone} />
          <Button icon="undo" label={t('common.map.drawUndo')} disabled={cornerCount === 0} onPress={onUndo} />
          <Button icon="plus" label={t('common.map.drawHere')} onPress={onCorner} />
          <Button kind="quiet" label={t('common.map.drawCancel')} onPress={onCancel} />
        </View>
      </Panel>
    </View>
  )
}

const styles = StyleSheet.create({
  buttons: { position: 'absolute', right: SPACE.medium, bottom: SPACE.medium, gap: SPACE.small },
  joined: { marginTop: -1.5 },
  bar: { position: 'absolute', left: SPACE.small, right: 72, top: SPACE.small, maxWidth: 560 },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small },
})
