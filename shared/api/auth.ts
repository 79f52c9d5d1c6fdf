import { z } from 'zod'
import { account, role } from '@/shared/schemas/person'
import { email, id, password, typedText } from '@/shared/schemas/primitives'
import { defineEndpoint, nothing } from './defineEndpoint'

export const session = z.object({
  accessToken: z.string(),
  expiresInS: z.number().int(),
  account,
})
export type Session = z.infer<typeof session>

const device = z.object({ deviceId: id, name: typedText(120) })
const token = z.object({ token: z.string().min(1).max(200) })

export const signIn = defineEndpoint({
  method: 'POST',
  path: '/auth/sign-in',
  audience: 'public',
  summary: 'Sign in with e-mail and password; sets the refresh cookie and enrols the device.',
  params: nothing,
  query: nothing,
  body: z.object({ email, password: z.string().min(1).max(200), device }),
  response: session,
})

export const refreshSession = defineEndpoint({
  method: 'POST',
  path: '/auth/refresh',
  audience: 'public',
  summary: 'Rotate the refresh cookie. The same rotationId repeats the same rotation.',
  params: nothing,
  query: nothing,
  body: z.object({ rotationId: z.string().regex(/^[0-9a-f]{32}$/) }),
  response: session,
})

export const signOut = defineEndpoint({
  method: 'POST',
  path: '/auth/sign-out',
  audience: 'public',
  summary: 'End this session. Nothing on the device is deleted.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: nothing,
})

export const askPasswordReset = defineEndpoint({
  method: 'POST',
  path: '/auth/password-reset',
  audience: 'public',
  summary: 'Send a reset link, if the address is known. The answer is the same either way.',
  params: nothing,
  query: nothing,
  body: z.object({ email }),
  response: nothing,
  status: 202,
})

export const confirmPasswordReset = defineEndpoint({
  method: 'POST',
  path: '/auth/password-reset/confirm',
  audience: 'public',
  summary: 'Set a new password with the token of the reset link; ends all sessions.',
  params: nothing,
  query: nothing,
  body: z.object({ token: token.shape.token, password }),
  response: nothing,
})

export const readInvitation = defineEndpoint({
  method: 'GET',
  path: '/auth/invitations/:token',
  audience: 'public',
  summary: 'What an invitation link offers.',
  params: token,
  query: nothing,
  body: nothing,
  response: z.object({ organisationName: z.string(), email: z.string(), name: z.string(), roles: z.array(role) }),
})

export const acceptInvitation = defineEndpoint({
  method: 'POST',
  path: '/auth/invitations/:token/accept',
  audience: 'public',
  summary: 'Join with a name and a password.',
  params: token,
  query: nothing,
  body: z.object({ name: typedText(120).min(1), password, device }),
  response: session,
})

export const readAccount = defineEndpoint({
  method: 'GET',
  path: '/account',
  audience: 'signed-in',
  summary: 'Who is signed in.',
  params: nothing,
  query: nothing,
  body: nothing,
  response: account,
})
