import { csvText } from '@/components/ui/csvText'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { downloadText } from '@/components/ui/web/downloadText'
import type { Material } from '@/shared/compute/factors/vocabulary'
import { formatCount, formatDecimal, formatShare } from '@/shared/format'
import type { RunBuilding } from '@/shared/schemas/run'
import { buildingMassKg } from './buildingMeasure'
import { buildingCsvRows } from './buildingCsvRows'

interface BuildingTableProps {
  readonly buildings: readonly RunBuilding[]
  readonly material: Material | 'all'
  readonly selectedId: string | null
  readonly onSelect: (building: RunBuilding) => void
  readonly fileName: string
}

/** The buildings of a run as a list: the same as on the map, for keyboard and paper. */
export function BuildingTable({ buildings, material, selectedId, onSelect, fileName }: BuildingTableProps) {
  const { t, locale } = useMessages()
  const mass = (building: RunBuilding): number => buildingMassKg(building, material) ?? NaN
  const orNull = (value: number): number | null => (Number.isFinite(value) ? value : null)
  return (
    <DataTable
      label={t('district.buildings')}
      rows={buildings}
      rowKey={({ buildingId }) => buildingId}
      selectedKey={selectedId}
      onPressRow={onSelect}
      rowLabel={({ label }) => t('district.open', { building: label })}
      columns={[
        {
          key: 'label',
          head: t('district.address'),
          cell: ({ label }) => label,
          sortBy: ({ label }) => label,
          weight: 2,
          minWidth: 150,
        },
        {
          key: 'area',
          head: t('district.floorAreaHead'),
          cell: ({ grossFloorAreaM2 }) => formatCount(grossFloorAreaM2, locale),
          sortBy: ({ grossFloorAreaM2 }) => grossFloorAreaM2,
          align: 'right',
        },
        {
          key: 'standing',
          head: t('district.standingHead'),
          cell: (building) => formatDecimal(mass(building) / 1000, locale, 1),
          sortBy: (building) => orNull(mass(building)),
          align: 'right',
        },
        {
          key: 'density',
          head: t('district.densityHead'),
          cell: (building) => formatDecimal(mass(building) / 1000 / building.footprintM2, locale, 2),
          sortBy: (building) => orNull(mass(building) / building.footprintM2),
          align: 'right',
        },
        {
          key: 'ten',
          head: t('district.chanceTenHead'),
          cell: ({ chanceTenYears }) => formatShare(chanceTenYears, locale),
          sortBy: ({ chanceTenYears }) => chanceTenYears,
          align: 'right',
        },
        {
          key: 'thirty',
          head: t('district.chanceThirtyHead'),
          cell: ({ chanceThirtyYears }) => formatShare(chanceThirtyYears, locale),
          sortBy: ({ chanceThirtyYears }) => chanceThirtyYears,
          align: 'right',
        },
        {
          key: 'expected',
          head: t('district.expectedHead'),
          cell: (building) => formatDecimal((mass(building) * building.chanceTenYears) / 1000, locale, 1),
          sortBy: (building) => orNull(mass(building) * building.chanceTenYears),
          align: 'right',
        },
      ]}
      onSaveCsv={() => downloadText(fileName, csvText(buildingCsvRows(buildings)), 'text/csv')}
    />
  )
}
