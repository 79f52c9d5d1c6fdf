import { useRouter } from 'expo-router'
import { Button } from '@/components/ui/Button'
import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { downloadText } from '@/components/ui/web/downloadText'
import {
  formatCount,
  formatDecimal,
  formatMassFigure,
  formatShare,
  formatYearRange,
  massUnitFor,
} from '@/shared/format'
import type { Receipt, ReceiptBuilding } from '@/shared/schemas/receipt'
import { receiptHref } from './receiptHref'

/** The buildings of one group, or the slices of one building, and the way on to the sheet. */
export function BuildingParts({ receipt }: { readonly receipt: Receipt }) {
  const { t, locale } = useMessages()
  const router = useRouter()
  const { buildings, massKg, run, figure } = receipt
  const unit = massUnitFor(buildings.map((building) => building.massKg))
  const isFlow = figure.kind !== 'stock'
  const sheetHref = `/review/${figure.buildingId ?? ''}`
  return (
    <Panel title={t('receipts.buildingList')}>
      <DataTable
        label={t('receipts.buildingList')}
        rows={buildings}
        rowKey={(building) =>
          `${building.buildingId}/${building.use}/${building.structure}/${building.period}/${building.floorAreaM2}`
        }
        rowLabel={({ label }) => t('receipts.openBuilding', { building: label })}
        onPressRow={
          figure.buildingId === null
            ? ({ buildingId }) => {
                const { kind, material, fromYear, toYear } = figure
                router.push(receiptHref({ runId: run.runId, kind, material, fromYear, toYear, buildingId }))
              }
            : undefined
        }
        columns={[
          {
            key: 'label',
            head: t('receipts.building'),
            cell: ({ label }) => label,
            sortBy: ({ label }) => label,
            weight: 2,
            minWidth: 150,
          },
          {
            key: 'years',
            head: t('receipts.years'),
            cell: (building) => yearsOf(building) ?? t('receipts.yearsUnknown'),
            sortBy: ({ yearFrom }) => yearFrom,
            minWidth: 100,
          },
          {
            key: 'area',
            head: t('receipts.floorArea'),
            cell: ({ floorAreaM2 }) => formatCount(floorAreaM2, locale),
            sortBy: ({ floorAreaM2 }) => floorAreaM2,
            align: 'right',
          },
          {
            key: 'error',
            head: t('receipts.areaError'),
            cell: ({ floorAreaM2, floorAreaCv }) => formatCount(floorAreaM2 * floorAreaCv, locale),
            align: 'right',
          },
          ...(isFlow
            ? [
                {
                  key: 'multiplier',
                  head: t('receipts.multiplier'),
                  cell: ({ hazardMultiplier }: ReceiptBuilding) => formatDecimal(hazardMultiplier, locale, 2),
                  align: 'right' as const,
                },
                {
                  key: 'chance',
                  head: t('receipts.chance'),
                  cell: ({ chance }: ReceiptBuilding) => formatShare(chance ?? NaN, locale),
                  sortBy: ({ chance }: ReceiptBuilding) => chance,
                  align: 'right' as const,
                },
              ]
            : []),
          {
            key: 'mass',
            head: t('receipts.mass', { unit }),
            cell: (building) => formatMassFigure(building.massKg, locale, unit),
            sortBy: (building) => building.massKg,
            align: 'right',
          },
        ]}
        totals={{
          label: t('common.total'),
          area: formatCount(
            buildings.reduce((all, { floorAreaM2 }) => all + floorAreaM2, 0),
            locale,
          ),
          mass: formatMassFigure(massKg, locale, unit),
        }}
        onSaveCsv={() =>
          downloadText(`run-${run.number}-receipt-buildings.csv`, csvText(buildingCsvRows(buildings)), 'text/csv')
        }
      />
      {figure.buildingId === null ? null : (
        <Button
          kind="secondary"
          label={t('receipts.openSheet')}
          href={sheetHref}
          onPress={() => router.push(sheetHref)}
        />
      )}
    </Panel>
  )
}

function yearsOf({ yearFrom, yearTo }: ReceiptBuilding): string | null {
  return yearFrom === null || yearTo === null ? null : formatYearRange(yearFrom, yearTo)
}

function buildingCsvRows(buildings: readonly ReceiptBuilding[]) {
  return [
    [
      'building_id',
      'label',
      'use',
      'structure',
      'period',
      'year_from',
      'year_to',
      'floor_area_m2',
      'floor_area_cv',
      'hazard_multiplier',
      'chance',
      'mass_kg',
    ],
    ...buildings.map((one) => [
      one.buildingId,
      one.label,
      one.use,
      one.structure,
      one.period,
      one.yearFrom,
      one.yearTo,
      one.floorAreaM2,
      one.floorAreaCv,
      one.hazardMultiplier,
      one.chance,
      one.massKg,
    ]),
  ]
}
