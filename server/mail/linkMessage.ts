import type { Message } from './mailer'

/** Who gets a link, and what for. */
export interface LinkRecipient {
  readonly to: string
  readonly name: string
  readonly organisationName: string
  readonly publicUrl: string
  readonly token: string
  /** BCP 47 tag of the language the person reads. */
  readonly language: string
}

/** The words of a message that carries one link. */
export interface LinkWords {
  readonly subject: string
  readonly greeting: string
  /** What the link does. */
  readonly opening: string
  readonly button: string
  readonly url: string
  /** How long it works, and what to do with a message one did not ask for. */
  readonly closing: string
}

/** Lays out a message with one link, as text and as HTML that loads nothing. */
export function linkMessage({ to, language }: LinkRecipient, words: LinkWords): Message {
  const text = [words.greeting, words.opening, words.url, words.closing].join('\n\n')
  const html = `<!doctype html>
<html lang="${escapeHtml(language)}">
<body style="margin:0;background:#F7F3EA;color:#20292E;font:17px/1.5 Barlow,Arial,sans-serif">
<div style="max-width:560px;margin:0 auto;padding:32px 24px;border-top:6px solid #20292E">
<p>${escapeHtml(words.greeting)}</p>
<p>${escapeHtml(words.opening)}</p>
<p><a href="${escapeHtml(words.url)}" style="display:inline-block;padding:14px 20px;background:#96381F;color:#F7F3EA;text-decoration:none;border-radius:2px">${escapeHtml(words.button)}</a></p>
<p style="font-size:15px;word-break:break-all">${escapeHtml(words.url)}</p>
<p style="font-size:15px;border-top:1px solid #D3CBB9;padding-top:16px">${escapeHtml(words.closing)}</p>
</div>
</body>
</html>
`
  return { to, subject: words.subject.replace(/[\r\n]+/g, ' '), text: `${text}\n`, html }
}

/** Text as text inside HTML. */
export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${character.codePointAt(0)};`)
}
