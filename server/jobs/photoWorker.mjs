import { parentPort } from 'node:worker_threads'
import { Jimp, JimpMime } from 'jimp'

const JPEG_QUALITY = 85
const THUMBNAIL_QUALITY = 75

/**
 * Decodes a picture fully and encodes it anew, so that nothing of the bytes that came is stored: no metadata, nothing
 * after the end of the picture. Runs in a thread of its own, with a cap on memory and time around it.
 *
 * @param {{ bytes: Uint8Array, longestPx: number, thumbnailPx: number, mostPixels: number }} task
 */
async function reencode({ bytes, longestPx, thumbnailPx, mostPixels }) {
  const picture = await Jimp.fromBuffer(Buffer.from(bytes), {
    [JimpMime.jpeg]: { tolerantDecoding: false, maxResolutionInMP: mostPixels / 1e6, maxMemoryUsageInMB: 1_024 },
  })
  shrink(picture, longestPx)
  const jpeg = await picture.getBuffer(JimpMime.jpeg, { quality: JPEG_QUALITY })
  const { width: widthPx, height: heightPx } = picture.bitmap
  shrink(picture, thumbnailPx)
  const thumbnail = await picture.getBuffer(JimpMime.jpeg, { quality: THUMBNAIL_QUALITY })
  return { jpeg: new Uint8Array(jpeg), thumbnail: new Uint8Array(thumbnail), widthPx, heightPx }
}

/** @param {{ bitmap: { width: number, height: number }, scaleToFit: (box: { w: number, h: number }) => unknown }} picture */
function shrink(picture, longestPx) {
  if (Math.max(picture.bitmap.width, picture.bitmap.height) > longestPx)
    picture.scaleToFit({ w: longestPx, h: longestPx })
}

parentPort?.on('message', (task) => {
  reencode(task).then(
    (picture) => parentPort?.postMessage({ picture }, [picture.jpeg.buffer, picture.thumbnail.buffer]),
    (error) => parentPort?.postMessage({ fault: error instanceof Error ? error.message : String(error) }),
  )
})
