import type { Context } from '@/server/context'

/** Sends a reset link if the address belongs to somebody who may sign in. The caller learns nothing of it. */
export async function askPasswordReset(
  { database, queue }: Pick<Context, 'database' | 'queue'>,
  email: string,
): Promise<void> {
  const [row] = await database.selectPublic<{ organisation_id: string; person_id: string; status: string }>(
    'SELECT organisation_id, person_id, status FROM sign_in_lookup($email)',
    { email },
  )
  if (row?.status !== 'active') return
  await queue.send('send-link', {
    organisationId: row.organisation_id,
    personId: row.person_id,
    purpose: 'password-reset',
  })
}
