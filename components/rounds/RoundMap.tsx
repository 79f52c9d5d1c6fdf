import { useQuery } from '@tanstack/react-query'
import { useCallback, useMemo } from 'react'
import { OutlineMap } from '@/components/map/OutlineMap'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import type { RoundWithBeats } from '@/shared/api/rounds'
import { useApi } from '@/sync/react/SessionProvider'
import { outlinesWithin } from './outlinesWithin'
import { districtBlocksQuery, districtOutlinesQuery } from './roundQueries'

interface RoundMapProps {
  readonly round: RoundWithBeats
  readonly selectedIds: readonly string[]
  readonly onToggle: (outlineId: string) => void
  /** Adds what lies in a drawn area. */
  readonly onAdd: (outlineIds: readonly string[]) => void
}

/** The frame on the map: free buildings pale, those of a beat in turn light and dark, blocks as lines. */
export function RoundMap({ round, selectedIds, onToggle, onAdd }: RoundMapProps) {
  const { t } = useMessages()
  const { colours } = useTheme()
  const api = useApi()
  const outlines = useQuery(districtOutlinesQuery(api, round.districtId))
  const blocks = useQuery(districtBlocksQuery(api, round.districtId))
  const beatOf = useMemo(
    () => new Map(round.buildings.map(({ outlineId, beatId }) => [outlineId, beatId])),
    [round.buildings],
  )
  const places = useMemo(() => new Map(round.beats.map(({ beatId }, place) => [beatId, place])), [round.beats])
  const paint = useCallback(
    (outlineId: string) => {
      const beatId = beatOf.get(outlineId)
      if (beatId === undefined) return { fill: colours.ground, opacity: 0.3 }
      if (beatId === null) return { fill: colours.panel, outline: colours.rule }
      const place = places.get(beatId) ?? 0
      const fills = [colours.good, colours.selection, colours.attention, colours.action] as const
      return { fill: fills[place % fills.length]!, opacity: 0.75, outline: colours.rule }
    },
    [beatOf, places, colours],
  )
  const drawn = useMemo(
    () =>
      (outlines.data?.features ?? []).map(({ id, geometry, properties }) => ({
        id,
        geometry,
        name: properties.reference,
      })),
    [outlines.data],
  )
  const areas = useMemo(
    () =>
      (blocks.data?.features ?? []).map(({ id, geometry, properties }) => ({ id, geometry, name: properties.name })),
    [blocks.data],
  )
  return (
    <OutlineMap
      label={t('rounds.roundMap')}
      outlines={drawn}
      paint={paint}
      selectedIds={selectedIds}
      onPress={onToggle}
      onDraw={(area) => onAdd(outlinesWithin(drawn, area).filter((outlineId) => beatOf.get(outlineId) !== undefined))}
      areas={areas}
      fitKey={`${round.roundId}-${drawn.length > 0}`}
      heightPx={460}
    />
  )
}
