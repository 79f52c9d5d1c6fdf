/** What the first bytes of a picture say of it. */
export interface ImageHeader {
  readonly kind: 'jpeg' | 'png'
  readonly widthPx: number
  readonly heightPx: number
}

const PNG_SIGNATURE = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])

/**
 * Reads kind and size of a picture from its own bytes, before anything decodes it. What a client called it does not
 * matter.
 *
 * @returns null when it is neither JPEG nor PNG, or breaks off before its size
 */
export function readImageHeader(bytes: Uint8Array): ImageHeader | null {
  const buffer = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  if (buffer.subarray(0, 8).equals(PNG_SIGNATURE)) return readPngHeader(buffer)
  if (buffer[0] === 0xff && buffer[1] === 0xd8 && buffer[2] === 0xff) return readJpegHeader(buffer)
  return null
}

function readPngHeader(buffer: Buffer): ImageHeader | null {
  if (buffer.length < 33 || buffer.toString('latin1', 12, 16) !== 'IHDR') return null
  return { kind: 'png', widthPx: buffer.readUInt32BE(16), heightPx: buffer.readUInt32BE(20) }
}

/** Goes from marker to marker up to the start of a frame. */
function readJpegHeader(buffer: Buffer): ImageHeader | null {
  let place = 2
  while (place + 9 < buffer.length) {
    if (buffer[place] !== 0xff) return null
    const marker = buffer[place + 1]!
    if (marker === 0xff) {
      place += 1
      continue
    }
    if (isFrameStart(marker)) {
      return { kind: 'jpeg', heightPx: buffer.readUInt16BE(place + 5), widthPx: buffer.readUInt16BE(place + 7) }
    }
    place += isBare(marker) ? 2 : 2 + Math.max(2, buffer.readUInt16BE(place + 2))
  }
  return null
}

/** SOF0 to SOF15 without the markers of tables between them. */
function isFrameStart(marker: number): boolean {
  return marker >= 0xc0 && marker <= 0xcf && marker !== 0xc4 && marker !== 0xc8 && marker !== 0xcc
}

function isBare(marker: number): boolean {
  return marker === 0x01 || (marker >= 0xd0 && marker <= 0xd8)
}
