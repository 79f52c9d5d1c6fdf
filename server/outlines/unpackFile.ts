import { Unzip, UnzipInflate, type UnzipFile } from 'fflate'
import { Refusal } from '@/server/errors'

/** Most bytes of an outline file, packed or not. */
export const FILE_BYTES = 100_000_000
const CHUNK_BYTES = 65_536
const ZIP_MARK = [0x50, 0x4b, 0x03, 0x04] as const

/**
 * Text of an uploaded file: GeoJSON as it is, or the one GeoJSON of a zip. Unpacking stops as soon as more comes out
 * than {@link FILE_BYTES}, whatever the zip says of itself.
 *
 * @throws {Refusal} `file-too-large`, `zip-not-readable`, `zip-without-outlines`, `file-not-text`
 */
export function unpackFile(bytes: Uint8Array): string {
  const isZip = ZIP_MARK.every((byte, index) => bytes[index] === byte)
  const content = isZip ? unzipOne(bytes) : bytes
  if (content.length > FILE_BYTES) throw tooLarge()
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(content)
  } catch {
    throw new Refusal(422, 'file-not-text', 'The file is not text in UTF-8. Nothing was imported; save it as GeoJSON.')
  }
}

function unzipOne(bytes: Uint8Array): Uint8Array {
  const chunks: Uint8Array[] = []
  let total = 0
  const names: string[] = []
  const take = (file: UnzipFile) => {
    if (!isOutlineFile(file.name)) return
    names.push(file.name)
    if (names.length > 1) throw zipOfSeveral(names)
    file.ondata = (error, chunk) => {
      // What is thrown here comes back as the error of a second call, so the size tells which it was.
      if (error) throw total > FILE_BYTES ? tooLarge() : notReadable()
      total += chunk.length
      if (total > FILE_BYTES) throw tooLarge()
      chunks.push(chunk)
    }
    file.start()
  }
  pushAll(new Unzip(take), bytes)
  if (names.length === 0) throw zipOfSeveral(names)
  return Buffer.concat(chunks)
}

function pushAll(unzip: Unzip, bytes: Uint8Array): void {
  unzip.register(UnzipInflate)
  try {
    for (let start = 0; start < bytes.length; start += CHUNK_BYTES) {
      const end = start + CHUNK_BYTES
      unzip.push(bytes.subarray(start, end), end >= bytes.length)
    }
  } catch (error) {
    throw error instanceof Refusal ? error : notReadable()
  }
}

function isOutlineFile(name: string): boolean {
  return /\.(geo)?json$/i.test(name) && !name.startsWith('__MACOSX/')
}

export const tooLarge = () =>
  new Refusal(413, 'file-too-large', 'The file holds more than 100 MB. Nothing was imported; cut it by district.')
const notReadable = () =>
  new Refusal(422, 'zip-not-readable', 'The zip cannot be unpacked. Nothing was imported; pack it again.')
const zipOfSeveral = (names: readonly string[]) =>
  new Refusal(
    422,
    'zip-without-outlines',
    `The zip holds ${names.length === 0 ? 'no' : 'more than one'} .geojson or .json file. Nothing was imported; pack exactly one.`,
  )
