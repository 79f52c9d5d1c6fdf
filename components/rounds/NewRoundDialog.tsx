import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useRouter, type Href } from 'expo-router'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Select } from '@/components/ui/Select'
import { TextField } from '@/components/ui/TextField'
import type { District } from '@/shared/api/outlines'
import { createRound } from '@/shared/api/rounds'
import { useApi } from '@/sync/react/SessionProvider'
import { roundKeys } from './roundQueries'

interface NewRoundDialogProps {
  readonly districts: readonly District[]
  readonly onClose: () => void
}

const DAY = /^\d{4}-\d{2}-\d{2}$/

/** Name, dates and district of a new round; its frame is every outline of the district. */
export function NewRoundDialog({ districts, onClose }: NewRoundDialogProps) {
  const { t } = useMessages()
  const api = useApi()
  const router = useRouter()
  const queries = useQueryClient()
  const [name, setName] = useState('')
  const [districtId, setDistrictId] = useState<string | null>(districts[0]?.districtId ?? null)
  const [startsOn, setStartsOn] = useState('')
  const [endsOn, setEndsOn] = useState('')
  const [wasTried, setTried] = useState(false)
  const make = useMutation({
    mutationFn: () => api.call(createRound, { body: { name, districtId: districtId ?? '', startsOn, endsOn } }),
    onSuccess: async (round) => {
      await queries.invalidateQueries({ queryKey: roundKeys.all })
      onClose()
      router.navigate(`/rounds/${round.roundId}` as Href)
    },
  })
  const faults = {
    name: name.trim() === '' ? t('rounds.faultName') : undefined,
    startsOn: DAY.test(startsOn) ? undefined : t('rounds.faultDay'),
    endsOn: !DAY.test(endsOn) ? t('rounds.faultDay') : endsOn < startsOn ? t('rounds.faultOrder') : undefined,
  }
  const handleMake = () => {
    setTried(true)
    if (!faults.name && !faults.startsOn && !faults.endsOn) make.mutate()
  }
  const shown = (fault: string | undefined) => (wasTried ? fault : undefined)
  return (
    <Dialog
      title={t('rounds.newRound')}
      isOpen
      onClose={onClose}
      actions={<Button kind="primary" label={t('rounds.openIt')} onPress={handleMake} busy={make.isPending} />}
    >
      <TextField label={t('rounds.name')} value={name} onChange={setName} error={shown(faults.name)} />
      <Select
        label={t('rounds.district')}
        value={districtId}
        onChange={setDistrictId}
        options={districts.map((district) => ({ value: district.districtId, label: district.name }))}
      />
      <TextField
        label={t('rounds.startsOn')}
        hint={t('rounds.dayHint')}
        value={startsOn}
        onChange={setStartsOn}
        error={shown(faults.startsOn)}
      />
      <TextField
        label={t('rounds.endsOn')}
        hint={t('rounds.dayHint')}
        value={endsOn}
        onChange={setEndsOn}
        error={shown(faults.endsOn)}
      />
      {make.error ? <ProblemNotice error={make.error} isSending /> : null}
    </Dialog>
  )
}
