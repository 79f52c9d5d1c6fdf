import { createMessages } from '@/shared/messages/createMessages'
import { linkMessage, type LinkRecipient } from './linkMessage'
import type { Message } from './mailer'

/** Lets a person set a new password. */
export function resetMessage(recipient: LinkRecipient): Message {
  const { t } = createMessages(recipient.language)
  return linkMessage(recipient, {
    subject: t('mail.reset.subject'),
    greeting: t('mail.greeting', { name: recipient.name }),
    opening: t('mail.reset.opening'),
    button: t('mail.reset.button'),
    url: `${recipient.publicUrl}/reset?token=${recipient.token}`,
    closing: t('mail.reset.closing'),
  })
}
