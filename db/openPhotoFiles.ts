import { Directory, File, Paths } from 'expo-file-system'
import type { PhotoFiles } from './photoFiles.types'

/** Photos of one person as files of the app. */
export async function openPhotoFiles(name: string): Promise<PhotoFiles> {
  const folder = new Directory(Paths.document, `${name}-photos`)
  if (!folder.exists) folder.create()
  const fileOf = (sha256: string) => new File(folder, sha256)
  return {
    async write(sha256, bytes) {
      const file = fileOf(sha256)
      if (!file.exists) file.create()
      file.write(bytes)
    },
    async read(sha256) {
      const file = fileOf(sha256)
      return file.exists ? file.bytes() : null
    },
    async remove(sha256) {
      const file = fileOf(sha256)
      if (file.exists) file.delete()
    },
  }
}
