import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { CheckBox } from '@/components/ui/CheckBox'
import { Choice } from '@/components/ui/Choice'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import { SPACE } from '@/components/ui/theme/tokens'
import { listBuilding } from '@/shared/api/listings'
import { formatMass } from '@/shared/format'
import { calendarDay } from '@/shared/schemas/primitives'
import type { RunSummary } from '@/shared/schemas/run'
import { useApi } from '@/sync/react/SessionProvider'
import { buildingsOfRunQuery, contractorsQuery, listedKeys } from './listedQueries'

interface ListBuildingDialogProps {
  readonly finished: readonly RunSummary[]
  readonly onClose: () => void
  readonly onListed: (listingId: string) => void
}

const MOST_FOUND = 6

/** Asks which building comes down when, and who may see its inventory. */
export function ListBuildingDialog({ finished, onClose, onListed }: ListBuildingDialogProps) {
  const { t, locale } = useMessages()
  const api = useApi()
  const queries = useQueryClient()
  const [runId, setRunId] = useState(finished[0]?.runId ?? null)
  const buildings = useQuery(buildingsOfRunQuery(api, runId))
  const contractors = useQuery(contractorsQuery(api))
  const [sought, setSought] = useState('')
  const [buildingId, setBuildingId] = useState<string | null>(null)
  const [comesDownOn, setDay] = useState('')
  const [note, setNote] = useState('')
  const [recipientIds, setRecipients] = useState<readonly string[]>([])
  const [wasSent, setWasSent] = useState(false)
  const wanted = sought.trim().toLowerCase()
  const found = (buildings.data ?? [])
    .filter(
      ({ buildingId: one, label }) => one === buildingId || (wanted !== '' && label.toLowerCase().includes(wanted)),
    )
    .slice(0, MOST_FOUND)
  const isDay = calendarDay.safeParse(comesDownOn).success
  const list = useMutation({
    mutationFn: (chosen: { runId: string; buildingId: string }) =>
      api.call(listBuilding, {
        body: { ...chosen, comesDownOn, note: note.trim() === '' ? null : note, recipientIds: [...recipientIds] },
      }),
    onSuccess: async ({ listingId }) => {
      await queries.invalidateQueries({ queryKey: listedKeys.all('desk') })
      onClose()
      onListed(listingId)
    },
  })
  const send = (): void => {
    setWasSent(true)
    if (runId !== null && buildingId !== null && isDay && recipientIds.length > 0) list.mutate({ runId, buildingId })
  }
  return (
    <Dialog
      title={t('listed.listOne')}
      isOpen
      onClose={onClose}
      actions={
        <>
          <Button kind="quiet" label={t('common.cancel')} onPress={onClose} />
          <Button kind="primary" label={t('listed.listIt')} busy={list.isPending} onPress={send} />
        </>
      }
    >
      <View style={styles.stack}>
        <AppText>{t('listed.listLead')}</AppText>
        {list.error ? <ProblemNotice error={list.error} isSending /> : null}
        {buildings.error ? <ProblemNotice error={buildings.error} /> : null}
        <Select
          label={t('runs.run')}
          options={finished.map(({ runId: value, number, roundName, scenario }) => ({
            value,
            label: t('runs.option', { number, round: roundName, scenario: scenario.name }),
          }))}
          value={runId}
          onChange={(value) => {
            setRunId(value)
            setBuildingId(null)
          }}
        />
        <TextField
          label={t('listed.find')}
          hint={t('listed.findHint')}
          value={sought}
          onChange={setSought}
          error={wasSent && buildingId === null ? t('listed.buildingMissing') : undefined}
        />
        {found.length > 0 ? (
          <Choice
            label={t('listed.building')}
            layout="stack"
            value={buildingId}
            onChange={setBuildingId}
            options={found.map(({ buildingId: value, label, massKg }) => ({
              value,
              label: `${label} · ${formatMass(massKg, locale)}`,
            }))}
          />
        ) : null}
        <TextField
          label={t('listed.comesDownOn')}
          hint={t('rounds.dayHint')}
          value={comesDownOn}
          onChange={setDay}
          error={wasSent && !isDay ? t('rounds.faultDay') : undefined}
        />
        <TextField label={t('listed.note')} value={note} onChange={setNote} maxLength={500} multiline />
        <View role="group" aria-label={t('publish.contractors')}>
          <AppText kind="label">{t('publish.contractors')}</AppText>
          {(contractors.data ?? []).map(({ personId, name, firm }) => (
            <CheckBox
              key={personId}
              label={firm === null ? name : t('publish.contractorOption', { name, firm })}
              checked={recipientIds.includes(personId)}
              onChange={(isChosen) =>
                setRecipients(isChosen ? [...recipientIds, personId] : recipientIds.filter((one) => one !== personId))
              }
            />
          ))}
        </View>
        {wasSent && recipientIds.length === 0 ? <Notice urgent whatHappened={t('publish.contractorsMissing')} /> : null}
      </View>
    </Dialog>
  )
}

const styles = StyleSheet.create({ stack: { gap: SPACE.medium } })
