import { Badge } from '@/components/ui/Badge'
import type { Column } from '@/components/ui/DataTable'
import type { Provenance } from '@/shared/compute/factors/vocabulary'
import type { Messages } from '@/shared/messages/messages.types'

interface Sourced {
  readonly source: string
  readonly provenance: Provenance
  readonly note: string | null
}

/** Where a row comes from, and what kind of source that is: at the end of every table of the factor book. */
export function sourceColumns<Row extends Sourced>({ t }: Messages): Column<Row>[] {
  return [
    {
      key: 'source',
      head: t('factorBook.source'),
      cell: ({ source, note }) => (note === null ? source : `${source} (${note})`),
      sortBy: ({ source }) => source,
      weight: 3,
      minWidth: 240,
    },
    {
      key: 'provenance',
      head: t('factorBook.provenance'),
      cell: ({ provenance }) => (
        <Badge
          tone={provenance === 'published' || provenance === 'open-dataset' ? 'good' : 'attention'}
          label={t(`vocabulary.provenance.${provenance}`)}
        />
      ),
      sortBy: ({ provenance }) => provenance,
      minWidth: 140,
    },
  ]
}
