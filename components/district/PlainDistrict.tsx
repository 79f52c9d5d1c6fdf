import { useQuery } from '@tanstack/react-query'
import { useMemo, useState, type ReactNode } from 'react'
import { StyleSheet, View } from 'react-native'
import { OutlineMap } from '@/components/map/OutlineMap'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { EmptyState } from '@/components/ui/EmptyState'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Screen } from '@/components/ui/Screen'
import { Select } from '@/components/ui/Select'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import type { District } from '@/shared/api/outlines'
import { useApi } from '@/sync/react/SessionProvider'
import { districtOutlinesQuery, districtsQuery } from './districtQueries'
import { outlineName } from './outlineName'
import { useMapRoom } from './useMapRoom'

/** The outlines of a district before there is a run, and what leads to one. */
export function PlainDistrict({ action }: { readonly action: ReactNode }) {
  const { t } = useMessages()
  const districts = useQuery(districtsQuery(useApi()))
  const { fills } = useMapRoom()
  const [wantedId, setWanted] = useState<string | null>(null)
  const district = districts.data?.find(({ districtId }) => districtId === wantedId) ?? districts.data?.[0]
  if (!district) {
    return (
      <Screen title={t('district.title')}>
        {districts.error ? <ProblemNotice error={districts.error} onRetry={() => void districts.refetch()} /> : null}
        {districts.isPending ? <AppText soft>{t('common.loading')}</AppText> : null}
        {districts.data ? <EmptyState title={t('district.noDistrict')} text={t('district.noDistrictText')} /> : null}
      </Screen>
    )
  }
  return (
    <Screen
      title={t('district.title')}
      subtitle={district.name}
      width="full"
      fill={fills}
      aside={<EmptyState title={t('district.noRun')} text={t('district.noRunText')} action={action} />}
    >
      <View style={fills ? styles.bar : undefined}>
        <Select
          label={t('district.district')}
          options={(districts.data ?? []).map(({ districtId, name }) => ({ value: districtId, label: name }))}
          value={district.districtId}
          onChange={setWanted}
        />
      </View>
      <PlainMap district={district} />
    </Screen>
  )
}

function PlainMap({ district }: { readonly district: District }) {
  const { t } = useMessages()
  const { colours } = useTheme()
  const { heightPx } = useMapRoom()
  const outlines = useQuery(districtOutlinesQuery(useApi(), district.districtId))
  const shapes = useMemo(
    () =>
      (outlines.data ?? []).map(({ geometry, properties }) => ({
        id: properties.outlineId,
        geometry,
        name: outlineName(properties),
      })),
    [outlines.data],
  )
  const paint = useMemo(() => () => ({ fill: colours.panel }), [colours])
  if (outlines.error) return <ProblemNotice error={outlines.error} onRetry={() => void outlines.refetch()} />
  return (
    <OutlineMap
      label={t('district.plainMapLabel', { district: district.name })}
      outlines={shapes}
      paint={paint}
      heightPx={heightPx}
      fitKey={shapes.length === 0 ? 'none' : district.districtId}
    />
  )
}

const styles = StyleSheet.create({ bar: { padding: SPACE.medium } })
