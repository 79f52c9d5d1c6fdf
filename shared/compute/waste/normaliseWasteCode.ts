import { ComputeError } from '@/shared/compute/errors'

/**
 * A waste code as the list prints it: three pairs of digits, an asterisk on hazardous entries.
 *
 * @param text code with or without blanks: `170101`, `17 06 05*`
 * @returns the printed form
 * @throws {ComputeError} `unknown-code` when the text is no six-digit code
 * @example
 * normaliseWasteCode('170605*') // => '17 06 05*'
 */
export function normaliseWasteCode(text: string): string {
  const [, chapter, group, entry, asterisk] = /^(\d{2})\s*(\d{2})\s*(\d{2})\s*(\*?)$/.exec(text.trim()) ?? []
  if (entry === undefined) throw new ComputeError('unknown-code', { code: text })
  return `${chapter} ${group} ${entry}${asterisk ?? ''}`
}
