import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useRouter, type Href } from 'expo-router'
import type { Polygon } from 'geojson'
import { useCallback, useMemo, useState } from 'react'
import { OutlineMap } from '@/components/map/OutlineMap'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Progress } from '@/components/ui/Progress'
import { Screen } from '@/components/ui/Screen'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { useToast } from '@/components/ui/Toast'
import { drawDistrict } from '@/shared/api/outlines'
import { formatCount } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { outlinesWithin } from './outlinesWithin'
import { districtOutlinesQuery, districtsQuery, roundKeys } from './roundQueries'

/** A district by its drawn edge: what lies inside is shown before it is made. */
export function DrawDistrictScreen() {
  const { t, locale } = useMessages()
  const { colours } = useTheme()
  const api = useApi()
  const router = useRouter()
  const toast = useToast()
  const queries = useQueryClient()
  const districts = useQuery(districtsQuery(api))
  const [chosenId, setChosenId] = useState<string | null>(null)
  const from =
    districts.data?.districts.find(({ districtId }) => districtId === chosenId) ?? districts.data?.districts[0]
  const outlines = useQuery(districtOutlinesQuery(api, from?.districtId))
  const shown = useMemo(
    () =>
      (outlines.data?.features ?? []).map(({ id, geometry, properties }) => ({
        id,
        geometry,
        name: properties.reference,
      })),
    [outlines.data],
  )
  const [area, setArea] = useState<Polygon | null>(null)
  const [name, setName] = useState('')
  const takenIds = useMemo(() => (area ? outlinesWithin(shown, area) : []), [area, shown])
  const paint = useCallback(() => ({ fill: colours.panel, outline: colours.rule }), [colours])
  const areas = useMemo(() => (area ? [{ id: 'drawn', geometry: area }] : []), [area])
  const make = useMutation({
    mutationFn: (drawn: Polygon) =>
      api.call(drawDistrict, { body: { name, geometry: { ...drawn, coordinates: drawn.coordinates.map(ringOf) } } }),
    onSuccess: async (district) => {
      await queries.invalidateQueries({ queryKey: roundKeys.districts })
      const counts = {
        outlines: formatCount(district.outlineCount, locale),
        blocks: formatCount(district.blockCount, locale),
      }
      toast(t('rounds.drawMade', { name: district.name, ...counts }), 'good')
      router.navigate('/rounds' as Href)
    },
  })
  const error = districts.error ?? outlines.error
  return (
    <Screen
      title={t('rounds.drawDistrict')}
      subtitle={t('rounds.drawSubtitle')}
      onBack={() => router.navigate('/rounds' as Href)}
      width="report"
    >
      {districts.isPending ? <Progress label={t('common.loading')} share={null} /> : null}
      {error ? <ProblemNotice error={error} /> : null}
      {from ? (
        <Panel title={t('rounds.drawArea')}>
          <Select
            label={t('rounds.drawFrom')}
            value={from.districtId}
            onChange={setChosenId}
            options={(districts.data?.districts ?? []).map((one) => ({ value: one.districtId, label: one.name }))}
          />
          <OutlineMap
            label={t('rounds.drawMap')}
            outlines={shown}
            paint={paint}
            selectedIds={takenIds}
            areas={areas}
            onDraw={setArea}
            fitKey={`${from.districtId}-${shown.length > 0}`}
            heightPx={460}
          />
          <AppText>
            {area ? t('rounds.drawTakes', { count: takenIds.length, district: from.name }) : t('rounds.drawNone')}
          </AppText>
          <TextField label={t('rounds.districtName')} value={name} onChange={setName} maxLength={120} />
          {make.error ? <ProblemNotice error={make.error} isSending /> : null}
          <Button
            kind="primary"
            label={t('rounds.drawMake')}
            busy={make.isPending}
            disabled={area === null || takenIds.length === 0 || name.trim() === ''}
            onPress={() => area && make.mutate(area)}
          />
        </Panel>
      ) : null}
    </Screen>
  )
}

const ringOf = (ring: Polygon['coordinates'][number]): [number, number][] => ring.map(([x = 0, y = 0]) => [x, y])
