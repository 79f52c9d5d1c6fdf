import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Choice } from '@/components/ui/Choice'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { NumberField } from '@/components/ui/NumberField'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import type { NextLooksReply } from '@/shared/api/nextLook'
import { bandAfterLooks } from '@/shared/compute/nextLook/bandAfterLooks'
import { formatCount, formatMassFigure, formatMassRange, formatShare, massUnitFor } from '@/shared/format'
import { visitsByBeat, visitsByStratum } from './planVisits'

const FIRST_VISITS = 20
const STEPS = [0, 5, 10, 20, 50, 100, 200] as const

/** How sure the figure becomes with a number of visits, and how they are shared out. */
export function PlanPanel({ ranked }: { readonly ranked: NextLooksReply }) {
  const { t, locale } = useMessages()
  const { looks } = ranked
  const [wanted, setWanted] = useState<number | null>(FIRST_VISITS)
  const [method, setMethod] = useState<'list' | 'strata'>('list')
  const visits = Math.max(0, Math.min(looks.length, Math.floor(wanted ?? 0)))
  const bands = bandsOf(ranked)
  const now = bands(0)
  const after = bands(visits)
  return (
    <Panel title={t('nextLook.plan')}>
      <View style={styles.row}>
        <View style={styles.field}>
          <NumberField whole label={t('nextLook.visits')} value={wanted} onChange={setWanted} />
        </View>
        <Choice
          label={t('nextLook.method')}
          options={[
            { value: 'list', label: t('nextLook.methodList') },
            { value: 'strata', label: t('nextLook.methodStrata') },
          ]}
          value={method}
          onChange={setMethod}
        />
      </View>
      {method === 'list' ? (
        <AppText>
          {t('nextLook.after', {
            visits: formatCount(visits, locale),
            range: formatMassRange(after.p10Kg, after.p90Kg, locale),
            share: formatShare(1 - widthOf(after) / widthOf(now), locale),
          })}
        </AppText>
      ) : null}
      {method === 'list' ? (
        <BeatPlanTable ranked={ranked} visits={visits} />
      ) : (
        <StratumPlanTable ranked={ranked} visits={visits} />
      )}
      <WidthTable ranked={ranked} />
    </Panel>
  )
}

interface Band {
  readonly p10Kg: number
  readonly p90Kg: number
}

function bandsOf({ meanKg, varianceKg2, looks }: NextLooksReply): (visits: number) => Band {
  const falls = looks.map(({ fallKg2 }) => fallKg2)
  return (visits) => bandAfterLooks(meanKg, varianceKg2, falls, visits)
}

function widthOf({ p10Kg, p90Kg }: Band): number {
  return p90Kg - p10Kg
}

function WidthTable({ ranked }: { readonly ranked: NextLooksReply }) {
  const { t, locale } = useMessages()
  const bands = bandsOf(ranked)
  const all = ranked.looks.length
  const rows = [...STEPS.filter((visits) => visits < all), all].map((visits) => ({ visits, ...bands(visits) }))
  const unit = massUnitFor(rows.map(({ p90Kg }) => p90Kg))
  const now = widthOf(bands(0))
  return (
    <>
      <DataTable
        label={t('nextLook.width')}
        showLabel
        rows={rows}
        rowKey={({ visits }) => String(visits)}
        columns={[
          {
            key: 'visits',
            head: t('nextLook.visitsHead'),
            cell: ({ visits }) =>
              visits === all
                ? `${formatCount(visits, locale)} (${t('nextLook.allLooks')})`
                : formatCount(visits, locale),
            minWidth: 120,
          },
          {
            key: 'low',
            head: t('nextLook.low', { unit }),
            cell: ({ p10Kg }) => formatMassFigure(p10Kg, locale, unit),
            align: 'right',
          },
          {
            key: 'high',
            head: t('nextLook.high', { unit }),
            cell: ({ p90Kg }) => formatMassFigure(p90Kg, locale, unit),
            align: 'right',
          },
          {
            key: 'width',
            head: t('nextLook.widthHead', { unit }),
            cell: (band) => formatMassFigure(widthOf(band), locale, unit),
            align: 'right',
          },
          {
            key: 'narrower',
            head: t('nextLook.narrower'),
            cell: (band) => formatShare(1 - widthOf(band) / now, locale),
            align: 'right',
          },
        ]}
      />
      <AppText soft>{t('nextLook.widthNote')}</AppText>
    </>
  )
}

interface PlanProps {
  readonly ranked: NextLooksReply
  readonly visits: number
}

function BeatPlanTable({ ranked: { looks, beats }, visits }: PlanProps) {
  const { t, locale } = useMessages()
  const nameOf = new Map(beats.map(({ beatId, name }) => [beatId, name]))
  return (
    <>
      <DataTable
        label={t('nextLook.byBeat')}
        showLabel
        rows={visitsByBeat(looks, visits)}
        rowKey={({ beatId }) => beatId ?? ''}
        columns={[
          {
            key: 'beat',
            head: t('nextLook.beat'),
            cell: ({ beatId }) => (beatId === null ? t('nextLook.noBeat') : (nameOf.get(beatId) ?? '')),
            weight: 2,
            minWidth: 140,
          },
          {
            key: 'list',
            head: t('nextLook.onList'),
            cell: ({ onListCount }) => formatCount(onListCount, locale),
            align: 'right',
          },
          {
            key: 'visits',
            head: t('nextLook.planned'),
            cell: ({ visitCount }) => formatCount(visitCount, locale),
            align: 'right',
          },
        ]}
        totals={{
          beat: t('common.total'),
          list: formatCount(looks.length, locale),
          visits: formatCount(visits, locale),
        }}
      />
      <AppText soft>{t('nextLook.listNote', { visits: formatCount(visits, locale) })}</AppText>
    </>
  )
}

function StratumPlanTable({ ranked: { looks }, visits }: PlanProps) {
  const { t, locale } = useMessages()
  const rows = visitsByStratum(looks, visits)
  const unit = massUnitFor(rows.map(({ sd }) => sd))
  return (
    <>
      <DataTable
        label={t('nextLook.byStratum')}
        showLabel
        rows={rows}
        rowKey={({ stratum }) => stratum}
        columns={[
          {
            key: 'use',
            head: t('nextLook.stratum'),
            cell: ({ stratum }) => t(`vocabulary.use.${stratum}`),
            weight: 2,
            minWidth: 140,
          },
          {
            key: 'frame',
            head: t('nextLook.frame'),
            cell: ({ frameCount }) => formatCount(frameCount, locale),
            align: 'right',
          },
          {
            key: 'spread',
            head: t('nextLook.spread', { unit }),
            cell: ({ sd }) => formatMassFigure(sd, locale, unit),
            align: 'right',
          },
          {
            key: 'visits',
            head: t('nextLook.planned'),
            cell: ({ visitCount }) => formatCount(visitCount, locale),
            align: 'right',
          },
        ]}
        totals={{
          use: t('common.total'),
          frame: formatCount(
            rows.reduce((all, { frameCount }) => all + frameCount, 0),
            locale,
          ),
          visits: formatCount(
            rows.reduce((all, { visitCount }) => all + visitCount, 0),
            locale,
          ),
        }}
      />
      <AppText soft>{t('nextLook.strataNote')}</AppText>
    </>
  )
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.medium },
  field: { flexBasis: 140, maxWidth: 200 },
})
