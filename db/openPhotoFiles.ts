import * as FileSystem from 'expo-file-system/legacy'
import type { PhotoFiles } from './photoFiles.types'

/** Photos of one person as files of the app. */
export async function openPhotoFiles(name: string): Promise<PhotoFiles> {
  const folder = `${FileSystem.documentDirectory ?? ''}${name}-photos/`
  await FileSystem.makeDirectoryAsync(folder, { intermediates: true })
  return {
    write: (sha256, bytes) =>
      FileSystem.writeAsStringAsync(folder + sha256, toBase64(bytes), { encoding: FileSystem.EncodingType.Base64 }),
    async read(sha256) {
      const found = await FileSystem.getInfoAsync(folder + sha256)
      if (!found.exists) return null
      const text = await FileSystem.readAsStringAsync(folder + sha256, { encoding: FileSystem.EncodingType.Base64 })
      return Uint8Array.from(atob(text), (character) => character.charCodeAt(0))
    },
    remove: (sha256) => FileSystem.deleteAsync(folder + sha256, { idempotent: true }),
  }
}

function toBase64(bytes: Uint8Array): string {
  let text = ''
  for (const byte of bytes) text += String.fromCharCode(byte)
  return btoa(text)
}
