import { useQuery } from '@tanstack/react-query'
import { useCallback, useMemo } from 'react'
import { OutlineMap } from '@/components/map/OutlineMap'
import { useMessages } from '@/components/ui/MessagesProvider'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import type { RoundWithBeats } from '@/shared/api/rounds'
import { useApi } from '@/sync/react/SessionProvider'
import { outlinesWithin } from './outlinesWithin'
import type { PlannedBeat } from './planBeats'
import { districtBlocksQuery, districtOutlinesQuery } from './roundQueries'

interface RoundMapProps {
  readonly round: RoundWithBeats
  readonly selectedIds: readonly string[]
  readonly onToggle: (outlineId: string) => void
  /** Adds what lies in a drawn area. */
  readonly onAdd: (outlineIds: readonly string[]) => void
  /** Beats that are proposed, painted as if they were made. */
  readonly planned: readonly PlannedBeat[]
}

/** The frame on the map: free buildings pale, those of a beat in turn light and dark, blocks as lines. */
export function RoundMap({ round, selectedIds, onToggle, onAdd, planned }: RoundMapProps) {
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
  const plannedPlaces = useMemo(
    () =>
      new Map(
        planned.flatMap(({ outlineIds }, place) =>
          outlineIds.map((outlineId) => [outlineId, round.beats.length + place] as const),
        ),
      ),
    [planned, round.beats.length],
  )
  const paint = useCallback(
    (outlineId: string) => {
      const fills = [colours.good, colours.selection, colours.attention, colours.action] as const
      const proposed = plannedPlaces.get(outlineId)
      if (proposed !== undefined) return { fill: fills[proposed % fills.length]!, opacity: 0.45, outline: colours.rule }
      const beatId = beatOf.get(outlineId)
      if (beatId === undefined) return { fill: colours.ground, opacity: 0.3 }
      if (beatId === null) return { fill: colours.panel, outline: colours.rule }
      const place = places.get(beatId) ?? 0
      return { fill: fills[place % fills.length]!, opacity: 0.75, outline: colours.rule }
    },
    [beatOf, places, plannedPlaces, colours],
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
