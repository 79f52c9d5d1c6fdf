import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { Button } from '@/components/ui/Button'
import { CheckBox } from '@/components/ui/CheckBox'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'
import { TextField } from '@/components/ui/TextField'
import { useToast } from '@/components/ui/Toast'
import { invitePerson } from '@/shared/api/people'
import { ROLES, type Role } from '@/shared/schemas/person'
import { useApi } from '@/sync/react/SessionProvider'

/** Name, address and roles of somebody new; the link goes by e-mail. */
export function InviteDialog({ onClose }: { readonly onClose: () => void }) {
  const { t } = useMessages()
  const api = useApi()
  const toast = useToast()
  const queries = useQueryClient()
  const [name, setName] = useState('')
  const [email, setEmail] = useState('')
  const [firm, setFirm] = useState('')
  const [roles, setRoles] = useState<readonly Role[]>(['surveyor'])
  const invite = useMutation({
    mutationFn: () =>
      api.call(invitePerson, { body: { name, email, roles: [...roles], firm: firm.trim() === '' ? null : firm } }),
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: ['people'] })
      toast(t('people.invited', { name }), 'good')
      onClose()
    },
  })
  const toggle = (role: Role) =>
    setRoles((now) => (now.includes(role) ? now.filter((other) => other !== role) : [...now, role]))
  return (
    <Dialog
      title={t('people.invite')}
      isOpen
      onClose={onClose}
      actions={
        <Button
          kind="primary"
          label={t('people.sendInvitation')}
          onPress={() => invite.mutate()}
          busy={invite.isPending}
          disabled={roles.length === 0 || name.trim() === '' || email.trim() === ''}
        />
      }
    >
      <TextField label={t('people.name')} value={name} onChange={setName} />
      <TextField label={t('people.email')} value={email} onChange={setEmail} keyboard="email-address" />
      {ROLES.map((role) => (
        <CheckBox
          key={role}
          label={t(`people.role.${role}`)}
          checked={roles.includes(role)}
          onChange={() => toggle(role)}
        />
      ))}
      {roles.includes('contractor') ? <TextField label={t('people.firm')} value={firm} onChange={setFirm} /> : null}
      {invite.error ? <ProblemNotice error={invite.error} isSending /> : null}
    </Dialog>
  )
}
