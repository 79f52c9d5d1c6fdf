/** The parts of a message that a person reads. */
export interface MimeMessage {
  readonly from: string
  readonly to: string
  readonly subject: string
  readonly text: string
  readonly html: string
}

interface Part {
  readonly headers: ReadonlyMap<string, string>
  readonly body: string
}

/**
 * Reads a message as our own mailer writes it: one text part, one html part, in quoted-printable, base64 or plain.
 * Not a reader for mail from strangers.
 */
export function readMimeMessage(source: string): MimeMessage {
  const message = splitPart(source)
  const parts = leaves(message)
  const content = (type: string) => {
    const part = parts.find(({ headers }) => (headers.get('content-type') ?? 'text/plain').startsWith(type))
    return part === undefined ? '' : decodeBody(part)
  }
  return {
    from: decodeWords(message.headers.get('from') ?? ''),
    to: decodeWords(message.headers.get('to') ?? ''),
    subject: decodeWords(message.headers.get('subject') ?? ''),
    text: content('text/plain'),
    html: content('text/html'),
  }
}

function splitPart(source: string): Part {
  const [head = '', ...rest] = source.split(/\r?\n\r?\n/)
  const lines = head.replace(/\r?\n[ \t]+/g, ' ').split(/\r?\n/)
  const headers = new Map(
    lines.map((line): [string, string] => {
      const colon = line.indexOf(':')
      return [line.slice(0, colon).trim().toLowerCase(), line.slice(colon + 1).trim()]
    }),
  )
  return { headers, body: rest.join('\n\n') }
}

function leaves(part: Part): Part[] {
  const boundary = /boundary="?([^";]+)"?/.exec(part.headers.get('content-type') ?? '')?.[1]
  if (boundary === undefined) return [part]
  const pieces = part.body.split(`--${boundary}`).slice(1)
  return pieces
    .filter((piece) => !piece.startsWith('--'))
    .flatMap((piece) => leaves(splitPart(piece.replace(/^\r?\n/, ''))))
}

function decodeBody({ headers, body }: Part): string {
  const encoding = (headers.get('content-transfer-encoding') ?? '7bit').toLowerCase()
  if (encoding === 'base64') return Buffer.from(body, 'base64').toString('utf8').trim()
  if (encoding === 'quoted-printable') return decodeQuoted(body.replace(/=\r?\n/g, '')).trim()
  return body.trim()
}

function decodeWords(header: string): string {
  return header
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?utf-8\?([bq])\?([^?]*)\?=/gi, (_whole, kind: string, text: string) =>
      kind.toLowerCase() === 'b'
        ? Buffer.from(text, 'base64').toString('utf8')
        : decodeQuoted(text.replaceAll('_', ' ')),
    )
}

function decodeQuoted(text: string): string {
  const bytes = Buffer.concat(
    text
      .split(/(=[0-9A-F]{2})/i)
      .map((piece) =>
        /^=[0-9A-F]{2}$/i.test(piece) ? Buffer.from(piece.slice(1), 'hex') : Buffer.from(piece, 'utf8'),
      ),
  )
  return bytes.toString('utf8')
}
