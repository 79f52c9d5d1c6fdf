import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { View } from 'react-native'
import { Course } from '@/components/charts/Course'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { TitleBlock } from '@/components/ui/TitleBlock'
import { MATERIALS } from '@/shared/compute/factors/vocabulary'
import { formatArea, formatDate, formatMass, formatYearRange } from '@/shared/format'
import type { ListingPage } from '@/shared/schemas/listing'
import { useApi } from '@/sync/react/SessionProvider'
import { ComparisonPanel } from './ComparisonPanel'
import { FindingsPanel } from './FindingsPanel'
import { InventoryTable } from './InventoryTable'
import { listingQuery, type ListedSide } from './listedQueries'
import { TicketsPanel } from './TicketsPanel'
import { WithdrawListingDialog } from './WithdrawListingDialog'

interface ListingPageScreenProps {
  readonly side: ListedSide
  readonly listingId: string
  readonly onBack: () => void
}

/** One building that comes down: what is in it, what to have sampled, and what was found and weighed. */
export function ListingPageScreen({ side, listingId, onBack }: ListingPageScreenProps) {
  const { t, locale } = useMessages()
  const { data: listing, error, refetch } = useQuery(listingQuery(useApi(), side, listingId))
  return (
    <Screen
      title={listing?.label ?? t('nav.listed')}
      subtitle={listing ? t('listed.subtitle', { day: formatDate(listing.comesDownOn, locale) }) : undefined}
      onBack={onBack}
      width="full"
      right={side === 'desk' && listing?.withdrawnAt === null ? <TakeBack listing={listing} /> : undefined}
    >
      {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
      {!listing && !error ? <AppText soft>{t('common.loading')}</AppText> : null}
      {listing ? <ListingBody side={side} listing={listing} /> : null}
    </Screen>
  )
}

function TakeBack({ listing }: { readonly listing: ListingPage }) {
  const { t } = useMessages()
  const [isAsking, setAsking] = useState(false)
  return (
    <>
      <Button label={t('listed.takeBack')} onPress={() => setAsking(true)} />
      {isAsking ? <WithdrawListingDialog listing={listing} onClose={() => setAsking(false)} /> : null}
    </>
  )
}

function ListingBody({ side, listing }: { readonly side: ListedSide; readonly listing: ListingPage }) {
  const { t, locale } = useMessages()
  const { inventory, label } = listing
  const name = `inventory-${label.toLowerCase().replaceAll(/[^a-z0-9]+/g, '-')}`
  return (
    <>
      {listing.withdrawalReason === null ? null : (
        <Notice whatHappened={t('listed.withdrawn', { reason: listing.withdrawalReason })} />
      )}
      <Notice tone="attention" whatHappened={t('loads.cautionEstimate')} whatIsSafe={t('loads.cautionHazard')} />
      {listing.note === null ? null : <AppText weight="semibold">{listing.note}</AppText>}
      <Panel title={t('listed.inventory')} note={aboutBuilding(listing, t, locale)}>
        <AppText kind="figure" size="figure">
          {formatMass(listing.massKg, locale)}
        </AppText>
        <Course parts={courseParts(listing)} rows={2} of={label} />
        <InventoryTable inventory={inventory} fileName={`${name}.csv`} />
        <AppText soft>{t('listed.inventoryNote')}</AppText>
      </Panel>
      <SuspicionsPanel listing={listing} />
      {side === 'yard' ? <TicketsPanel listing={listing} /> : null}
      <ComparisonPanel comparison={listing.comparison} fileName={`${name}-weighed.csv`} />
      <FindingsPanel side={side} listing={listing} />
      <TitleBlock
        cells={[
          { label: t('common.titleBlock.run'), value: String(listing.runNumber) },
          { label: t('common.titleBlock.place'), value: `${label} · ${listing.districtName}`, weight: 3 },
          { label: t('common.titleBlock.edition'), value: String(listing.editionNumber) },
          { label: t('common.titleBlock.by'), value: listing.listedByName, weight: 2 },
          { label: t('common.titleBlock.date'), value: formatDate(listing.listedAt, locale), weight: 2 },
        ]}
      />
    </>
  )
}

function SuspicionsPanel({ listing: { inventory } }: { readonly listing: ListingPage }) {
  const { t } = useMessages()
  return (
    <Panel title={t('listed.suspicions')} tone="attention">
      <AppText>{t('cautions.suspicion')}</AppText>
      {inventory.suspicions.length === 0 ? (
        <AppText>{t('listed.noSuspicion')}</AppText>
      ) : (
        <View>
          <DataTable
            label={t('listed.suspicions')}
            rows={inventory.suspicions}
            rowKey={({ substance, element }) => `${substance}/${element}`}
            columns={[
              { key: 'substance', head: t('listed.substance'), cell: ({ substance }) => substance, minWidth: 110 },
              { key: 'element', head: t('listed.element'), cell: ({ element }) => element, weight: 3, minWidth: 180 },
              {
                key: 'because',
                head: t('listed.because'),
                cell: ({ because }) => t(`listed.reason.${because}`),
                weight: 2,
                minWidth: 130,
              },
              { key: 'code', head: t('loads.code'), cell: ({ code }) => code },
              {
                key: 'source',
                head: t('loads.source'),
                cell: ({ source, provenance }) => `${source} (${t(`vocabulary.provenance.${provenance}`)})`,
                weight: 4,
                minWidth: 220,
              },
            ]}
          />
        </View>
      )}
      <AppText weight="semibold">{t('cautions.doNotTouch')}</AppText>
    </Panel>
  )
}

function courseParts({ inventory: { lines } }: ListingPage) {
  return MATERIALS.map((material) => ({
    material,
    massKg: lines.filter((line) => line.material === material).reduce((total, { massKg }) => total + massKg.likely, 0),
  }))
    .filter(({ massKg }) => massKg > 0)
    .sort((one, other) => other.massKg - one.massKg)
}

function aboutBuilding(
  { inventory: { use, structure, yearFrom, yearTo, grossFloorAreaM2 } }: ListingPage,
  t: ReturnType<typeof useMessages>['t'],
  locale: string,
): string {
  const years = yearFrom === null || yearTo === null ? t('common.notKnown') : formatYearRange(yearFrom, yearTo)
  return [
    t(`vocabulary.use.${use}`),
    t(`vocabulary.structure.${structure}`),
    t('listed.built', { years }),
    formatArea(grossFloorAreaM2, locale),
  ].join(' · ')
}
