import type { Mailer, Message } from '@/server/mail/mailer'

export interface FakeMailer extends Mailer {
  readonly messages: Message[]
  /** The newest message to an address. @throws when there is none */
  lastTo(address: string): Message
  /** The last path element or token of the link in the newest message to an address. */
  tokenTo(address: string): string
  /** Every message from now on is refused. */
  breakDown(): void
}

/** Keeps messages instead of sending them. */
export function fakeMailer(): FakeMailer {
  const messages: Message[] = []
  let isBroken = false
  const lastTo = (address: string) => {
    const message = messages.findLast(({ to }) => to === address)
    if (!message) throw new Error(`no message to ${address}; there are ${messages.length}`)
    return message
  }
  return {
    messages,
    lastTo,
    tokenTo(address) {
      const token = /(?:\/join\/|[?&]token=)([\w-]{20,})/.exec(lastTo(address).text)?.[1]
      if (token === undefined) throw new Error(`no link in the message to ${address}`)
      return token
    },
    breakDown() {
      isBroken = true
    },
    async send(message) {
      if (isBroken) throw new Error('the mail server did not take the message')
      messages.push(message)
    },
    async close() {},
  }
}
