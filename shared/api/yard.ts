import { yardPlan } from '@/shared/schemas/yardPlan'
import { defineEndpoint, nothing } from './defineEndpoint'

export const readYardPlan = defineEndpoint({
  method: 'GET',
  path: '/yard/plan',
  audience: ['contractor'],
  summary: 'My vehicles, my plant and my recovery shares.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: yardPlan,
})

export const saveYardPlan = defineEndpoint({
  method: 'PUT',
  path: '/yard/plan',
  audience: ['contractor'],
  summary: 'Keep my vehicles, my plant and my recovery shares; nobody else sees them.',
  params: nothing,
  query: nothing,
  body: yardPlan,
  response: yardPlan,
})
