import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { DataTable } from '@/components/ui/DataTable'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Progress } from '@/components/ui/Progress'
import { Screen } from '@/components/ui/Screen'
import { changePerson, listPeople } from '@/shared/api/people'
import type { Person } from '@/shared/schemas/person'
import { useApi } from '@/sync/react/SessionProvider'
import { InviteDialog } from './InviteDialog'

const PEOPLE_KEY = ['people'] as const

/** The people of the organisation: invite, disable, enable. */
export function PeopleScreen() {
  const { t } = useMessages()
  const api = useApi()
  const [isInviting, setInviting] = useState(false)
  const [chosen, setChosen] = useState<Person | null>(null)
  const people = useQuery({ queryKey: PEOPLE_KEY, queryFn: () => api.call(listPeople) })
  return (
    <Screen title={t('nav.people')} subtitle={t('people.subtitle')} width="report">
      <Panel title={t('nav.people')} action={<Button label={t('people.invite')} onPress={() => setInviting(true)} />}>
        {people.isPending ? <Progress label={t('common.loading')} share={null} /> : null}
        {people.error ? <ProblemNotice error={people.error} onRetry={() => void people.refetch()} /> : null}
        <DataTable
          label={t('nav.people')}
          rows={people.data?.people ?? []}
          rowKey={(person) => person.personId}
          onPressRow={setChosen}
          rowLabel={(person) => t('people.change', { name: person.name })}
          columns={[
            { key: 'name', head: t('people.name'), cell: (person) => person.name, sortBy: (person) => person.name },
            { key: 'email', head: t('people.email'), weight: 2, cell: (person) => person.email },
            {
              key: 'roles',
              head: t('people.roles'),
              weight: 2,
              cell: (person) => person.roles.map((role) => t(`people.role.${role}`)).join(', '),
            },
            { key: 'firm', head: t('people.firm'), cell: (person) => person.firm ?? '–' },
            { key: 'status', head: t('people.status'), cell: (person) => t(`people.state.${person.status}`) },
          ]}
        />
      </Panel>
      {isInviting ? <InviteDialog onClose={() => setInviting(false)} /> : null}
      {chosen ? <PersonDialog person={chosen} onClose={() => setChosen(null)} /> : null}
    </Screen>
  )
}

function PersonDialog({ person, onClose }: { readonly person: Person; readonly onClose: () => void }) {
  const { t } = useMessages()
  const api = useApi()
  const queries = useQueryClient()
  const isDisabled = person.status === 'disabled'
  const change = useMutation({
    mutationFn: () =>
      api.call(changePerson, {
        params: { personId: person.personId },
        body: { status: isDisabled ? 'active' : 'disabled' },
      }),
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: PEOPLE_KEY })
      onClose()
    },
  })
  return (
    <Dialog
      title={person.name}
      isOpen
      onClose={onClose}
      actions={
        <Button
          kind={isDisabled ? 'secondary' : 'danger'}
          label={isDisabled ? t('people.enable') : t('people.disable')}
          onPress={() => change.mutate()}
          busy={change.isPending}
          disabled={person.status === 'invited'}
        />
      }
    >
      <AppText>{isDisabled ? t('people.enableText') : t('people.disableText')}</AppText>
      {change.error ? <ProblemNotice error={change.error} isSending /> : null}
    </Dialog>
  )
}
