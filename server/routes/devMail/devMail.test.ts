import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ConfigError, readConfig } from '@/server/config'
import { createApp } from '@/server/createApp'
import { openMailer } from '@/server/mail/openMailer'
import { startMailSink, type MailSink } from '@/server/mail/startMailSink'
import { createTestContext, TEST_SECRET, type TestContext } from '@/tests/support/createTestContext'

let mailSink: MailSink
let context: TestContext
beforeAll(async () => {
  mailSink = await startMailSink(() => new Date('2026-12-01T08:00:00Z'))
  const mailer = openMailer(mailSink.url, 'Tallystone <no-reply@tallystone.invalid>')
  await mailer.send({
    to: 'bo@ferrow.invalid',
    subject: 'Grüße, <b>Bo</b> — a rather long subject that needs more than one line of the header to fit in',
    text: 'Über den Fluß.\n\nhttp://127.0.0.1:8080/join/abc_def-123\n\n=20 stays as it is, and so does this long line which is folded on its way and unfolded on arrival.',
    html: '<p>Über den Fluß <a href="http://127.0.0.1:8080/join/abc_def-123">Join</a></p>',
  })
  await mailer.close()
  context = createTestContext('postgres://nobody@127.0.0.1:1/none', { config: { hasDevMail: true } })
})
afterAll(() => mailSink.close())

describe('the local mail server', () => {
  it('keeps what was sent, word for word', () => {
    const [message] = mailSink.messages()

    expect(message).toMatchObject({
      number: 1,
      to: 'bo@ferrow.invalid',
      from: 'Tallystone <no-reply@tallystone.invalid>',
      subject: 'Grüße, <b>Bo</b> — a rather long subject that needs more than one line of the header to fit in',
      html: '<p>Über den Fluß <a href="http://127.0.0.1:8080/join/abc_def-123">Join</a></p>',
    })
    expect(message?.text.replaceAll('\r\n', '\n')).toBe(
      'Über den Fluß.\n\nhttp://127.0.0.1:8080/join/abc_def-123\n\n=20 stays as it is, and so does this long line which is folded on its way and unfolded on arrival.',
    )
  })
})

describe('/dev/mail', () => {
  const open = (path: string, overrides = {}) =>
    request(createApp({ ...context, mailSink, config: { ...context.config, ...overrides } })).get(path)

  it('lists messages, and shows one with its link', async () => {
    const list = await open('/dev/mail')
    const message = await open('/dev/mail/1')

    expect(list.text).toContain('href="/dev/mail/1"')
    expect(list.text).not.toContain('<b>Bo</b>')
    expect(message.text).toContain('<a href="http://127.0.0.1:8080/join/abc_def-123">')
    expect((await open('/dev/mail/1/html')).text).toContain('Über den Fluß')
    expect((await open('/dev/mail/7')).status).toBe(404)
  })

  it('is not there unless the settings open it, and production refuses that setting', async () => {
    expect((await open('/dev/mail', { hasDevMail: false })).status).toBe(404)
    const environment = {
      NODE_ENV: 'production' as const,
      DATABASE_URL: 'postgres://x',
      SESSION_SECRET: TEST_SECRET,
      DEV_MAIL: '1',
    }
    expect(() => readConfig(environment)).toThrow(ConfigError)
  })
})
