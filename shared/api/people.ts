import { z } from 'zod'
import { invitation, person, role } from '@/shared/schemas/person'
import { id } from '@/shared/schemas/primitives'
import { defineEndpoint, nothing } from './defineEndpoint'

export const listPeople = defineEndpoint({
  method: 'GET',
  path: '/people',
  audience: ['steward', 'planner'],
  summary: 'The people of the organisation.',
  params: nothing,
  query: z.object({ role: role.optional() }),
  body: nothing,
  response: z.object({ people: z.array(person) }),
})

export const invitePerson = defineEndpoint({
  method: 'POST',
  path: '/people/invitations',
  audience: ['steward'],
  summary: 'Invite a person by e-mail.',
  params: nothing,
  query: nothing,
  body: invitation,
  response: person,
  status: 201,
})

export const changePerson = defineEndpoint({
  method: 'PATCH',
  path: '/people/:personId',
  audience: ['steward'],
  summary: 'Change roles, or disable and enable a person. Disabling ends all sessions at once.',
  params: z.object({ personId: id }),
  query: nothing,
  body: z.object({ roles: z.array(role).min(1).optional(), status: z.enum(['active', 'disabled']).optional() }),
  response: person,
})
