import { createTransport } from 'nodemailer'
import type { Mailer } from './mailer'

const TIMEOUT_MS = 20_000

/** Hands messages to a mail server at an smtp:// or smtps:// address. */
export function openMailer(mailUrl: string, mailFrom: string): Mailer {
  const transport = createTransport(
    { url: mailUrl, connectionTimeout: TIMEOUT_MS, greetingTimeout: TIMEOUT_MS, socketTimeout: TIMEOUT_MS },
    { from: mailFrom, disableFileAccess: true, disableUrlAccess: true },
  )
  return {
    async send({ to, subject, text, html }) {
      await transport.sendMail({ to, subject, text, html })
    },
    async close() {
      transport.close()
    },
  }
}
