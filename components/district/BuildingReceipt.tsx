import { StyleSheet, View } from 'react-native'
import { Course } from '@/components/charts/Course'
import { ReceiptFigure } from '@/components/receipts/ReceiptFigure'
import { receiptHref } from '@/components/receipts/receiptHref'
import { MaterialName } from '@/components/runs/MaterialName'
import { AppText } from '@/components/ui/AppText'
import { DataTable } from '@/components/ui/DataTable'
import { IconButton } from '@/components/ui/IconButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { SPACE } from '@/components/ui/theme/tokens'
import { MATERIALS } from '@/shared/compute/factors/vocabulary'
import { formatArea, formatDecimal, formatMass, formatShare, formatYearRange } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { RunBuilding } from '@/shared/schemas/run'

interface BuildingReceiptProps {
  readonly runId: string
  readonly building: RunBuilding
  readonly onClose: () => void
}

/** How a building's figures come about: what it is, and floor area times factor for each material. */
export function BuildingReceipt({ runId, building, onClose }: BuildingReceiptProps) {
  const messages = useMessages()
  const { t, locale } = messages
  const { colours } = useTheme()
  const lines = MATERIALS.flatMap((material) => {
    const massKg = building.massByMaterialKg[material]
    return massKg === undefined ? [] : [{ material, massKg }]
  }).sort((one, other) => other.massKg - one.massKg)
  const area = building.grossFloorAreaM2
  return (
    <Panel
      title={`${t('district.receipt')}: ${building.label}`}
      tone="selection"
      action={<IconButton icon="close" label={t('district.closeReceipt')} onPress={onClose} />}
    >
      <ReceiptFigure
        text={`${formatMass(building.massKg, locale)} ${t('district.standing')}`}
        what={`${building.label} ${t('district.standing')}`}
        href={receiptHref({ runId, kind: 'stock', buildingId: building.buildingId })}
      />
      <Course parts={lines.filter(({ massKg }) => massKg > 0)} rows={2} of={building.label} />
      <View role="list" aria-label={t('district.receipt')}>
        {facts(building, messages).map(({ label, value }) => (
          <View key={label} role="listitem" style={[styles.fact, { borderColor: colours.hairline }]}>
            <AppText kind="label">{label}</AppText>
            <View style={styles.value}>
              <AppText kind="number" align="right">
                {value}
              </AppText>
            </View>
          </View>
        ))}
      </View>
      <AppText soft>{t('district.expectedFormula')}</AppText>
      <DataTable
        label={t('district.lines')}
        showLabel
        rows={lines}
        rowKey={({ material }) => material}
        columns={[
          {
            key: 'material',
            head: t('common.material'),
            cell: ({ material }) => <MaterialName material={material} />,
            weight: 2,
            minWidth: 132,
          },
          {
            key: 'factor',
            head: t('district.factorHead'),
            cell: ({ massKg }) => formatDecimal(area > 0 ? massKg / area : NaN, locale, 1),
            align: 'right',
            minWidth: 80,
          },
          {
            key: 'mass',
            head: t('district.massHead'),
            cell: ({ massKg }) => formatDecimal(massKg / 1000, locale, 1),
            align: 'right',
            minWidth: 64,
          },
        ]}
        totals={{
          material: t('common.total'),
          factor: formatDecimal(area > 0 ? building.massKg / area : NaN, locale, 1),
          mass: formatDecimal(building.massKg / 1000, locale, 1),
        }}
      />
    </Panel>
  )
}

function facts(building: RunBuilding, messages: Messages): { label: string; value: string }[] {
  const { t, locale } = messages
  return [
    { label: t('district.use'), value: t(`vocabulary.use.${building.use}`) },
    { label: t('district.structure'), value: t(`vocabulary.structure.${building.structure}`) },
    { label: t('district.years'), value: yearsText(building, messages) },
    {
      label: t('district.floorArea'),
      value: t('district.floorAreaValue', {
        area: formatArea(building.grossFloorAreaM2, locale),
        deviation: formatArea(building.grossFloorAreaM2 * building.floorAreaCv, locale),
      }),
    },
    { label: t('district.footprint'), value: formatArea(building.footprintM2, locale) },
    { label: t('district.chanceTen'), value: formatShare(building.chanceTenYears, locale) },
    { label: t('district.chanceThirty'), value: formatShare(building.chanceThirtyYears, locale) },
    { label: t('district.expectedTen'), value: formatMass(building.massKg * building.chanceTenYears, locale) },
  ]
}

function yearsText({ yearFrom, yearTo }: RunBuilding, { t }: Messages): string {
  if (yearFrom !== null && yearTo !== null) return formatYearRange(yearFrom, yearTo)
  if (yearTo !== null) return t('district.before', { year: yearTo + 1 })
  if (yearFrom !== null) return t('district.after', { year: yearFrom - 1 })
  return t('district.yearsNotKnown')
}

const styles = StyleSheet.create({
  fact: {
    flexDirection: 'row',
    justifyContent: 'space-between',
    alignItems: 'baseline',
    gap: SPACE.medium,
    borderTopWidth: 1,
    paddingVertical: SPACE.tight,
  },
  value: { flexShrink: 1 },
})
