import { z } from 'zod'
import { email, id, moment, typedText } from './primitives'

export const ROLES = ['surveyor', 'planner', 'contractor', 'steward'] as const
export const role = z.enum(ROLES)
export type Role = z.infer<typeof role>

export const personStatus = z.enum(['invited', 'active', 'disabled'])

/** Who is signed in, and for whom. */
export const account = z.object({
  personId: id,
  organisationId: id,
  organisationName: z.string(),
  isDemo: z.boolean(),
  name: z.string(),
  email: z.string(),
  roles: z.array(role),
  language: z.string(),
})
export type Account = z.infer<typeof account>

export const person = z.object({
  personId: id,
  name: z.string(),
  email: z.string(),
  roles: z.array(role),
  status: personStatus,
  firm: z.string().nullable(),
  lastSeenAt: moment.nullable(),
})
export type Person = z.infer<typeof person>

export const invitation = z.object({
  email,
  name: typedText(120).min(1),
  roles: z.array(role).min(1),
  firm: typedText(120).nullable().default(null),
})
