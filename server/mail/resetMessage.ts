import { linkMessage, type LinkRecipient } from './linkMessage'
import type { Message } from './mailer'

/** Lets a person set a new password. */
export function resetMessage({ to, name, publicUrl, token }: LinkRecipient): Message {
  return linkMessage(to, {
    subject: 'A new password for Tallystone',
    greeting: `Good day ${name},`,
    opening:
      'Somebody asked for a new password for this address. Open the link to choose it. All devices are signed out then; what they hold stays on them.',
    button: 'Choose a new password',
    url: `${publicUrl}/reset?token=${token}`,
    closing: 'The link works once and for one hour. If it was not you, leave it alone; your password stays as it is.',
  })
}
