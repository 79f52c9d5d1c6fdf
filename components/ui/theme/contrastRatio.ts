/**
 * Contrast of two colours as WCAG 2.2 defines it,
 *
 *     (L1 + 0.05) / (L2 + 0.05)
 *
 * with L the relative luminance, the lighter above.
 *
 * @param one colour as `#RRGGBB`
 * @param other colour as `#RRGGBB`
 * @returns contrast [–], from 1 to 21
 * @throws {RangeError} a colour is not written as `#RRGGBB`
 * @see W3C (2023). Web Content Accessibility Guidelines 2.2, "contrast ratio" and "relative luminance".
 */
export function contrastRatio(one: string, other: string): number {
  const [lighter, darker] = [luminance(one), luminance(other)].sort((a, b) => b - a)
  return ((lighter ?? 0) + 0.05) / ((darker ?? 0) + 0.05)
}

function luminance(colour: string): number {
  if (!/^#[0-9a-f]{6}$/i.test(colour)) throw new RangeError(`a colour is written as #RRGGBB, not ${colour}`)
  const [red, green, blue] = [1, 3, 5].map((start) => linear(Number.parseInt(colour.slice(start, start + 2), 16) / 255))
  return 0.2126 * (red ?? 0) + 0.7152 * (green ?? 0) + 0.0722 * (blue ?? 0)
}

function linear(channel: number): number {
  return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4
}
