import { useState } from 'react'
import { AppText } from '@/components/ui/AppText'
import { Choice } from '@/components/ui/Choice'
import { useMessages } from '@/components/ui/MessagesProvider'
import type { FullEdition } from '@/shared/schemas/factorBook'
import { IntensityTable } from './IntensityTable'
import { densityColumns, lifetimeColumns, suspicionColumns, wasteCodeColumns } from './partColumns'
import { PartTable } from './PartTable'

const PARTS = ['intensities', 'lifetimes', 'densities', 'wasteCodes', 'suspicions'] as const
type Part = (typeof PARTS)[number]

/** The parts of an edition, one at a time. */
export function EditionParts({ edition }: { readonly edition: FullEdition }) {
  const messages = useMessages()
  const { t } = messages
  const [part, setPart] = useState<Part>('intensities')
  const { rows } = edition
  const fileName = `factor-book-${edition.number}-${part}.csv`
  const title = t(`factorBook.${part}`)
  return (
    <>
      <Choice
        label={t('factorBook.part')}
        options={PARTS.map((value) => ({ value, label: t(`factorBook.${value}`) }))}
        value={part}
        onChange={setPart}
      />
      <AppText soft>{t('factorBook.fromMemoryNote')}</AppText>
      {part === 'intensities' ? <IntensityTable rows={rows.intensities} fileName={fileName} /> : null}
      {part === 'lifetimes' ? (
        <PartTable title={title} rows={rows.lifetimes} columns={lifetimeColumns(messages)} fileName={fileName} />
      ) : null}
      {part === 'densities' ? (
        <PartTable title={title} rows={rows.densities} columns={densityColumns(messages)} fileName={fileName} />
      ) : null}
      {part === 'wasteCodes' ? (
        <PartTable title={title} rows={rows.wasteCodes} columns={wasteCodeColumns(messages)} fileName={fileName} />
      ) : null}
      {part === 'suspicions' ? (
        <PartTable
          title={title}
          note={t('factorBook.suspicionNote')}
          rows={rows.suspicions}
          columns={suspicionColumns(messages)}
          fileName={fileName}
        />
      ) : null}
    </>
  )
}
