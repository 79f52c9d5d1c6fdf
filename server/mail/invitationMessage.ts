import { createMessages } from '@/shared/messages/createMessages'
import { linkMessage, type LinkRecipient } from './linkMessage'
import type { Message } from './mailer'

/** Invites a person to join an organisation. */
export function invitationMessage(recipient: LinkRecipient): Message {
  const { t } = createMessages(recipient.language)
  const organisation = recipient.organisationName
  return linkMessage(recipient, {
    subject: t('mail.invitation.subject', { organisation }),
    greeting: t('mail.greeting', { name: recipient.name }),
    opening: t('mail.invitation.opening', { organisation }),
    button: t('mail.invitation.button'),
    url: `${recipient.publicUrl}/join/${recipient.token}`,
    closing: t('mail.invitation.closing'),
  })
}
