import { useQuery } from '@tanstack/react-query'
import { ScrollView, StyleSheet } from 'react-native'
import { CheckBox } from '@/components/ui/CheckBox'
import { useMessages } from '@/components/ui/MessagesProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import type { RoundWithBeats } from '@/shared/api/rounds'
import { useApi } from '@/sync/react/SessionProvider'
import { districtOutlinesQuery, districtBlocksQuery } from './roundQueries'

interface BlockListProps {
  readonly round: RoundWithBeats
  readonly selectedIds: readonly string[]
  readonly onToggle: (outlineIds: readonly string[]) => void
}

/** The map's blocks as a list, for those who cannot use a map or want whole blocks. */
export function BlockList({ round, selectedIds, onToggle }: BlockListProps) {
  const { t } = useMessages()
  const api = useApi()
  const outlines = useQuery(districtOutlinesQuery(api, round.districtId))
  const blocks = useQuery(districtBlocksQuery(api, round.districtId))
  const inFrame = new Set(round.buildings.map(({ outlineId }) => outlineId))
  const chosen = new Set(selectedIds)
  const rows = (blocks.data?.features ?? []).flatMap(({ id, properties }) => {
    const outlineIds = (outlines.data?.features ?? [])
      .filter((feature) => feature.properties.blockId === id && inFrame.has(feature.id))
      .map((feature) => feature.id)
    return outlineIds.length > 0 ? [{ id, name: properties.name, outlineIds }] : []
  })
  return (
    <ScrollView style={styles.list} contentContainerStyle={styles.rows} aria-label={t('rounds.blockList')}>
      {rows.map(({ id, name, outlineIds }) => (
        <CheckBox
          key={id}
          label={t('rounds.blockOf', { name, buildings: t('common.buildings', { count: outlineIds.length }) })}
          checked={outlineIds.every((outlineId) => chosen.has(outlineId))}
          onChange={() => onToggle(outlineIds)}
        />
      ))}
    </ScrollView>
  )
}

const styles = StyleSheet.create({ list: { maxHeight: 280 }, rows: { gap: SPACE.small } })
