import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useMemo, useState } from 'react'
import { OutlineMap } from '@/components/map/OutlineMap'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { confirmImport, discardImport, type StagedImport } from '@/shared/api/outlines'
import { formatCount } from '@/shared/format'
import type { AttributeMapping } from '@/shared/schemas/outline'
import { useApi } from '@/sync/react/SessionProvider'
import { ImportFaults } from './ImportFaults'
import { districtsQuery, importPreviewQuery, roundKeys } from './roundQueries'

export interface ImportDone {
  readonly importedCount: number
  readonly leftOutCount: number
  readonly blockCount: number
}

interface ImportMappingProps {
  readonly staged: StagedImport
  readonly onDone: (done: ImportDone) => void
  readonly onDiscard: () => void
}

const OURS = ['reference', 'street', 'houseNumber', 'year', 'storeys', 'heightM', 'use'] as const
const NONE = ' '
const NEW_DISTRICT = ' new'

/** What the file holds, which of its names mean which of ours, and into which district it goes. */
export function ImportMapping({ staged, onDone, onDiscard }: ImportMappingProps) {
  const { t, locale } = useMessages()
  const { colours } = useTheme()
  const api = useApi()
  const queries = useQueryClient()
  const [mapping, setMapping] = useState<AttributeMapping>(staged.guess)
  const [districtId, setDistrictId] = useState<string>(NEW_DISTRICT)
  const [name, setName] = useState('')
  const districts = useQuery(districtsQuery(api))
  const preview = useQuery(importPreviewQuery(api, staged.importId))
  const outlines = useMemo(
    () => (preview.data?.features ?? []).map(({ id, geometry }) => ({ id: String(id), geometry })),
    [preview.data],
  )
  const paint = useMemo(() => () => ({ fill: colours.sunken, outline: colours.ink }), [colours])
  const take = useMutation({
    mutationFn: () =>
      api.call(confirmImport, {
        params: { importId: staged.importId },
        body: { mapping, district: districtId === NEW_DISTRICT ? { name } : { districtId } },
      }),
    onSuccess: async (done) => {
      await queries.invalidateQueries({ queryKey: roundKeys.districts })
      onDone(done)
    },
  })
  const discard = useMutation({
    mutationFn: () => api.call(discardImport, { params: { importId: staged.importId } }),
    onSuccess: onDiscard,
  })
  return (
    <>
      <Panel
        title={staged.fileName}
        note={t('rounds.usable', {
          usable: formatCount(staged.usableCount, locale),
          all: formatCount(staged.featureCount, locale),
        })}
      >
        <OutlineMap
          label={t('rounds.previewMap')}
          outlines={outlines}
          paint={paint}
          fitKey={staged.importId}
          heightPx={360}
        />
        <ImportFaults faults={staged.faults} />
      </Panel>
      <Panel title={t('rounds.names')}>
        <AppText soft>{t('rounds.namesHint')}</AppText>
        {OURS.map((ours) => (
          <Select
            key={ours}
            label={t(`rounds.ours.${ours}`)}
            value={mapping[ours] ?? NONE}
            onChange={(theirs) => setMapping({ ...mapping, [ours]: theirs === NONE ? null : theirs })}
            options={[
              { value: NONE, label: t('rounds.leaveEmpty') },
              ...staged.attributes.map(({ name: theirs, samples }) => ({
                value: theirs,
                label: `${theirs} (${samples.slice(0, 2).join(', ')})`,
              })),
            ]}
          />
        ))}
      </Panel>
      <Panel title={t('rounds.district')}>
        <Select
          label={t('rounds.intoDistrict')}
          value={districtId}
          onChange={setDistrictId}
          options={[
            { value: NEW_DISTRICT, label: t('rounds.aNewDistrict') },
            ...(districts.data?.districts ?? []).map((district) => ({
              value: district.districtId,
              label: district.name,
            })),
          ]}
        />
        {districtId === NEW_DISTRICT ? (
          <TextField label={t('rounds.districtName')} value={name} onChange={setName} />
        ) : null}
        {take.error ? <ProblemNotice error={take.error} isSending /> : null}
        <Button
          kind="primary"
          label={t('rounds.importNow', { count: staged.usableCount })}
          onPress={() => take.mutate()}
          busy={take.isPending}
          disabled={districtId === NEW_DISTRICT && name.trim() === ''}
        />
        <Button kind="quiet" label={t('rounds.discard')} onPress={() => discard.mutate()} busy={discard.isPending} />
      </Panel>
    </>
  )
}
