import { createHash } from 'node:crypto'
import { deflateSync } from 'node:zlib'
import { Jimp, JimpMime } from 'jimp'

/** A small real picture. */
export async function buildPicture({
  widthPx = 64,
  heightPx = 48,
  kind = 'jpeg',
  colour = 0x336699ff,
}: { widthPx?: number; heightPx?: number; kind?: 'jpeg' | 'png'; colour?: number } = {}): Promise<Buffer> {
  const picture = new Jimp({ width: widthPx, height: heightPx, color: colour })
  for (let place = 0; place < widthPx * heightPx * 4; place += 37 * 4) picture.bitmap.data[place] = (place * 7) & 0xff
  return kind === 'png' ? picture.getBuffer(JimpMime.png) : picture.getBuffer(JimpMime.jpeg, { quality: 80 })
}

/** The picture with a segment of metadata right behind its start, as a camera writes it. */
export function withMetadata(jpeg: Buffer, text: string): Buffer {
  const content = Buffer.from(text, 'latin1')
  const length = Buffer.alloc(2)
  length.writeUInt16BE(content.length + 2)
  return Buffer.concat([jpeg.subarray(0, 2), Buffer.from([0xff, 0xe1]), length, content, jpeg.subarray(2)])
}

/** A PNG of a few bytes that says it is very large. */
export function hugePng(widthPx: number, heightPx: number): Buffer {
  const header = Buffer.alloc(13)
  header.writeUInt32BE(widthPx, 0)
  header.writeUInt32BE(heightPx, 4)
  header.set([8, 6, 0, 0, 0], 8)
  const content = deflateSync(Buffer.alloc(100_000))
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    pngChunk('IHDR', header),
    pngChunk('IDAT', content),
    pngChunk('IEND', Buffer.alloc(0)),
  ])
}

/** The header of a JPEG that says it is as large as one can be, and nothing after it. */
export function hugeJpegHeader(): Buffer {
  return Buffer.from([
    0xff, 0xd8, 0xff, 0xc0, 0x00, 0x11, 0x08, 0xff, 0xff, 0xff, 0xff, 0x03, 0x01, 0x22, 0x00, 0x02, 0x11, 0x01, 0x03,
    0x11, 0x01, 0xff, 0xd9,
  ])
}

function pngChunk(name: string, content: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(name, 'latin1'), content])
  const chunk = Buffer.alloc(8)
  chunk.writeUInt32BE(content.length, 0)
  chunk.writeUInt32BE(crc32(body), 4)
  return Buffer.concat([chunk.subarray(0, 4), body, chunk.subarray(4)])
}

function crc32(bytes: Uint8Array): number {
  let crc = ~0
  for (const byte of bytes) {
    crc ^= byte
    for (let bit = 0; bit < 8; bit += 1) crc = (crc >>> 1) ^ (crc & 1 ? 0xedb88320 : 0)
  }
  return ~crc >>> 0
}

export function sha256Hex(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex')
}
