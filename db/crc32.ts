/**
 * Check sum of a text's UTF-8 bytes, CRC-32 as of gzip and PNG.
 *
 * @example
 * crc32('123456789') // => 0xcbf43926
 */
export function crc32(text: string): number {
  let crc = 0xffffffff
  for (const byte of new TextEncoder().encode(text)) {
    crc ^= byte
    for (let bit = 0; bit < 8; bit += 1) crc = (crc >>> 1) ^ (crc & 1 ? 0xedb88320 : 0)
  }
  return (crc ^ 0xffffffff) >>> 0
}
