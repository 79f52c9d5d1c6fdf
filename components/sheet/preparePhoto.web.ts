import { sha256Hex } from '@/db/exportBag'
import type { PreparedPhoto } from './preparePhoto.types'

const LONGEST_PX = 2048
const QUALITY = 0.8

/**
 * Draws a picture anew at 2048 px at most: smaller, and without anything a camera writes into it (place, time, number).
 *
 * @throws {Error} it is no picture this browser can read
 */
export async function preparePhoto(file: Blob): Promise<PreparedPhoto> {
  const bitmap = await createImageBitmap(file)
  const scale = Math.min(1, LONGEST_PX / Math.max(bitmap.width, bitmap.height))
  const canvas = document.createElement('canvas')
  canvas.width = Math.max(1, Math.round(bitmap.width * scale))
  canvas.height = Math.max(1, Math.round(bitmap.height * scale))
  const context = canvas.getContext('2d')
  if (!context) throw new Error('no drawing surface')
  context.drawImage(bitmap, 0, 0, canvas.width, canvas.height)
  bitmap.close()
  const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/jpeg', QUALITY))
  if (!blob) throw new Error('the picture could not be written')
  const bytes = new Uint8Array(await blob.arrayBuffer())
  return { bytes, sha256: await sha256Hex(bytes), widthPx: canvas.width, heightPx: canvas.height, mime: 'image/jpeg' }
}
