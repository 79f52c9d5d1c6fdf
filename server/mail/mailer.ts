/** One message to one person. */
export interface Message {
  readonly to: string
  readonly subject: string
  readonly text: string
  readonly html: string
}

export interface Mailer {
  /** @throws when the mail server did not take the message; nothing was sent then. */
  send(message: Message): Promise<void>
  close(): Promise<void>
}
