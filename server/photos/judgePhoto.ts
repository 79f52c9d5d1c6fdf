import { MOST_PIXELS, type DecodeResult, type PhotoDecoder, type ReencodedPhoto } from '@/server/jobs/photoDecoder'
import { readImageHeader } from './readImageHeader'

export type PhotoVerdict = { readonly photo: ReencodedPhoto } | { readonly refusal: string }

/**
 * Looks at the bytes of a photo: kind and size from its own header first, then a full decode that encodes it afresh
 * (rule U5). What is no picture, or would take too much to look at, is refused in words.
 */
export async function judgePhoto(decoder: PhotoDecoder, bytes: Uint8Array): Promise<PhotoVerdict> {
  const header = readImageHeader(bytes)
  if (!header) return { refusal: 'This is not a JPEG or PNG picture.' }
  const pixels = header.widthPx * header.heightPx
  if (pixels === 0) return { refusal: 'This picture has no size.' }
  if (pixels > MOST_PIXELS) {
    return {
      refusal: `This picture has ${Math.round(pixels / 1e6)} million pixels; at most ${MOST_PIXELS / 1e6} million are taken.`,
    }
  }
  const result = await decoder.decode(bytes)
  return 'photo' in result ? result : { refusal: FAULTS[result.fault] }
}

const FAULTS: Readonly<Record<Extract<DecodeResult, { fault: string }>['fault'], string>> = {
  'not-decodable': 'This picture is damaged or breaks off.',
  'took-too-long': 'This picture could not be looked at in time.',
  'took-too-much-memory': 'This picture takes more memory to look at than is allowed.',
}
