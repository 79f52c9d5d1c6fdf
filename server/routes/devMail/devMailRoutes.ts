import { Router } from 'express'
import type { Context } from '@/server/context'
import { notFound } from '@/server/errors'
import { escapeHtml } from '@/server/mail/linkMessage'
import type { MailSink, SunkMessage } from '@/server/mail/startMailSink'

/**
 * Shows the messages that no mail server was there for. Mounted at /dev/mail only where the settings open it, which
 * they refuse in production.
 */
export function devMailRoutes({ mailSink }: Pick<Context, 'mailSink'>): Router {
  const router = Router()
  router.use((_request, response, next) => {
    response.set('Cache-Control', 'no-store')
    next()
  })

  router.get('/', (_request, response) => {
    const newestFirst = [...(mailSink?.messages() ?? [])].reverse()
    response.type('html').send(page('Messages', listOf(newestFirst)))
  })

  router.get('/:number', (request, response) => {
    const message = find(mailSink, request.params.number)
    response.type('html').send(page(message.subject, pageOf(message)))
  })

  router.get('/:number/html', (request, response) => {
    response.type('html').send(find(mailSink, request.params.number).html)
  })

  return router
}

function find(mailSink: MailSink | undefined, number: string): SunkMessage {
  const message = mailSink?.messages().find((candidate) => String(candidate.number) === number)
  if (!message) throw notFound('message')
  return message
}

function listOf(messages: readonly SunkMessage[]): string {
  if (messages.length === 0) return '<p>No message yet. Invite somebody, or ask for a new password.</p>'
  const rows = messages.map(
    ({ number, to, subject, receivedAt }) =>
      `<li><a href="/dev/mail/${number}">${escapeHtml(subject)}</a><br>to ${escapeHtml(to)}, ${escapeHtml(receivedAt)}</li>`,
  )
  return `<ol>${rows.join('\n')}</ol>`
}

function pageOf({ number, to, from, receivedAt, text }: SunkMessage): string {
  const linked = escapeHtml(text).replace(/https?:\/\/[^\s<&]+/g, (url) => `<a href="${url}">${url}</a>`)
  return `<p>from ${escapeHtml(from)}<br>to ${escapeHtml(to)}<br>${escapeHtml(receivedAt)}</p>
<pre style="white-space:pre-wrap;font:inherit">${linked}</pre>
<p><a href="/dev/mail/${number}/html">As the person sees it</a> · <a href="/dev/mail">All messages</a></p>`
}

function page(title: string, body: string): string {
  return `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${escapeHtml(title)}</title></head>
<body style="margin:0;background:#F7F3EA;color:#20292E;font:17px/1.5 Barlow,Arial,sans-serif">
<main style="max-width:720px;margin:0 auto;padding:24px;border-top:6px solid #20292E">
<h1 style="font-size:21px">${escapeHtml(title)}</h1>
${body}
<p style="font-size:15px;border-top:1px solid #D3CBB9;padding-top:16px">This page exists in development only. No message left this machine.</p>
</main>
</body>
</html>
`
}
