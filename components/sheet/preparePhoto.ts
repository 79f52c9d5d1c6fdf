import { manipulateAsync, SaveFormat } from 'expo-image-manipulator'
import { sha256Hex } from '@/db/exportBag'
import type { PreparedPhoto } from './preparePhoto.types'

const LONGEST_PX = 2048

/** Draws a picture anew at 2048 px at most, without anything a camera writes into it. */
export async function preparePhoto(file: Blob): Promise<PreparedPhoto> {
  const source = await asDataUri(file)
  const { width, height } = await manipulateAsync(source, [])
  const edge = width >= height ? { width: LONGEST_PX } : { height: LONGEST_PX }
  const actions = Math.max(width, height) > LONGEST_PX ? [{ resize: edge }] : []
  const saved = await manipulateAsync(source, actions, { base64: true, compress: 0.8, format: SaveFormat.JPEG })
  const bytes = Uint8Array.from(atob(saved.base64 ?? ''), (character) => character.charCodeAt(0))
  return { bytes, sha256: await sha256Hex(bytes), widthPx: saved.width, heightPx: saved.height, mime: 'image/jpeg' }
}

function asDataUri(file: Blob): Promise<string> {
  return new Promise((resolve, reject) => {
    const reader = new FileReader()
    reader.onload = () => resolve(String(reader.result))
    reader.onerror = () => reject(reader.error)
    reader.readAsDataURL(file)
  })
}
