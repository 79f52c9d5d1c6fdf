import { SMTPServer } from 'smtp-server'
import { readMimeMessage, type MimeMessage } from './readMimeMessage'

const KEPT_MESSAGES = 200
const MESSAGE_BYTES = 1_000_000

/** A mail server of our own that delivers to nobody: for development, tests and the first look. */
export interface MailSink {
  /** smtp:// address on loopback. */
  readonly url: string
  /** What came in, oldest first; the newest {@link KEPT_MESSAGES}. */
  messages(): readonly SunkMessage[]
  close(): Promise<void>
}

export interface SunkMessage extends MimeMessage {
  readonly number: number
  readonly receivedAt: string
}

/** Listens on a free loopback port and keeps what is sent there in memory. */
export async function startMailSink(now: () => Date): Promise<MailSink> {
  const messages: SunkMessage[] = []
  let count = 0
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    size: MESSAGE_BYTES,
    disableReverseLookup: true,
    onData(stream, _session, onTaken) {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('end', () => {
        count += 1
        const message = readMimeMessage(Buffer.concat(chunks).toString('utf8'))
        messages.push({ ...message, number: count, receivedAt: now().toISOString() })
        if (messages.length > KEPT_MESSAGES) messages.shift()
        onTaken()
      })
    },
  })
  const listening = server.listen(0, '127.0.0.1')
  await new Promise<void>((resolve, reject) => {
    listening.once('listening', resolve)
    server.once('error', reject)
  })
  const address = listening.address()
  if (address === null || typeof address === 'string') throw new Error('the local mail server has no port')
  return {
    url: `smtp://127.0.0.1:${address.port}`,
    messages: () => messages,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  }
}
