import { makeOneTimeToken } from '@/server/auth/oneTimeToken'
import type { Context } from '@/server/context'
import type { JobPayloads } from '@/server/jobs/queue'
import { invitationMessage } from '@/server/mail/invitationMessage'
import { resetMessage } from '@/server/mail/resetMessage'
import { storeToken } from './storeToken'

interface RecipientRow {
  name: string
  email: string
  status: string
  language: string
  organisation_name: string
}

/**
 * Makes a one-time link and mails it. The token exists only here and in the message; the database keeps its digest.
 * Earlier links of the same purpose stop working. Does nothing when the person is no longer waiting for such a link.
 */
export async function sendLink(
  context: Pick<Context, 'config' | 'database' | 'mailer' | 'now'>,
  { organisationId, personId, purpose }: JobPayloads['send-link'],
): Promise<void> {
  const made = makeOneTimeToken()
  const recipient = await context.database.withScope({ organisationId, personId }, async (scope) => {
    const [row] = await scope.select<RecipientRow>(
      `SELECT p.name, p.email, p.status, p.language, o.name AS organisation_name
       FROM person p JOIN organisation o USING (organisation_id)
       WHERE p.organisation_id = $organisationId AND p.person_id = $personId`,
      { organisationId, personId },
    )
    if (row?.status !== (purpose === 'invitation' ? 'invited' : 'active')) return undefined
    await storeToken(scope, { purpose, tokenSha256: made.tokenSha256, now: context.now() })
    return row
  })
  if (!recipient) return
  const write = purpose === 'invitation' ? invitationMessage : resetMessage
  await context.mailer.send(
    write({
      to: recipient.email,
      name: recipient.name,
      organisationName: recipient.organisation_name,
      publicUrl: context.config.publicUrl,
      token: made.token,
      language: recipient.language,
    }),
  )
}
