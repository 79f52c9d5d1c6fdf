import { useQuery } from '@tanstack/react-query'
import { useCallback, useMemo } from 'react'
import { MapLegend } from '@/components/map/MapLegend'
import { OutlineMap } from '@/components/map/OutlineMap'
import type { OutlinePaint } from '@/components/map/OutlineMap.types'
import { quantileBreaks, rampColour } from '@/components/map/ramp'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import type { NextLooksReply } from '@/shared/api/nextLook'
import { formatDecimal } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { lookFigureText } from './lookFigureText'
import { lookOutlinesQuery } from './nextLookQueries'

interface LookMapProps {
  readonly districtId: string
  readonly districtName: string
  readonly ranked: NextLooksReply
}

const HEIGHT_PX = 420
const STEPS = 4

/** The frame shaded by what a look at each building would settle. */
export function LookMap({ districtId, districtName, ranked: { looks, figure } }: LookMapProps) {
  const { t, locale } = useMessages()
  const { colours } = useTheme()
  const read = useQuery(lookOutlinesQuery(useApi(), districtId))
  const outlines = useMemo(
    () =>
      (read.data ?? []).map(({ id, geometry, properties }) => ({
        id,
        geometry,
        name: [properties.street, properties.houseNumber].filter(Boolean).join(' ') || properties.reference,
      })),
    [read.data],
  )
  const shares = useMemo(() => new Map(looks.map(({ outlineId, settleShare }) => [outlineId, settleShare])), [looks])
  const breaks = useMemo(() => quantileBreaks([...shares.values()], STEPS), [shares])
  const paint = useCallback(
    (id: string): OutlinePaint => {
      const share = shares.get(id)
      return share === undefined ? { fill: colours.panel, opacity: 0.6 } : { fill: rampColour(share, breaks) }
    },
    [shares, breaks, colours],
  )
  if (read.error) return <ProblemNotice error={read.error} onRetry={() => void read.refetch()} />
  const percent = (share: number): string => `${formatDecimal(share * 100, locale, 2)} %`
  const floors = [0, ...breaks]
  return (
    <Panel title={t('nextLook.map', { figure: lookFigureText(figure, t) })} flush>
      <OutlineMap
        label={t('district.plainMapLabel', { district: districtName })}
        outlines={outlines}
        paint={paint}
        heightPx={HEIGHT_PX}
        fitKey={outlines.length === 0 ? 'none' : districtName}
        overlay={
          <MapLegend
            title={t('nextLook.mapLegend')}
            entries={[
              ...floors.map((floor, step) => ({
                key: String(floor),
                label:
                  step === 0
                    ? t('nextLook.legendUnder', { share: percent(breaks[0] ?? 1) })
                    : t('nextLook.legendFrom', { share: percent(floor) }),
                colour: rampColour(floor, breaks),
              })),
              { key: 'none', label: t('nextLook.notOnList'), colour: colours.panel },
            ]}
          />
        }
      />
    </Panel>
  )
}
