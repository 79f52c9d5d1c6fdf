import { linkMessage, type LinkRecipient } from './linkMessage'
import type { Message } from './mailer'

/** Invites a person to join an organisation. */
export function invitationMessage({ to, name, organisationName, publicUrl, token }: LinkRecipient): Message {
  return linkMessage(to, {
    subject: `${organisationName} invites you to Tallystone`,
    greeting: `Good day ${name},`,
    opening: `${organisationName} invites you to survey buildings and read their material stock with Tallystone. Open the link, choose a password, and you are in.`,
    button: 'Join',
    url: `${publicUrl}/join/${token}`,
    closing: 'The link works once and for seven days. If you did not expect it, leave it alone; nothing happens then.',
  })
}
