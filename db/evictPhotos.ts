import type { Statements } from './driver.types'
import type { PhotoFiles } from './photoFiles.types'

/** Removes the bytes of photos that the server has stored and nothing here waits for. @returns how many */
export async function evictPhotos(inside: Statements, photoFiles: PhotoFiles): Promise<number> {
  const rows = await inside.all<{ sha256: string }>(
    `SELECT DISTINCT fields ->> 'sha256' AS sha256 FROM base
     WHERE type = 'photo' AND fields ->> 'state' = 'stored'
       AND fields ->> 'sha256' NOT IN (SELECT meta ->> 'sha256' FROM photo WHERE is_removed = 0)`,
  )
  let count = 0
  for (const { sha256 } of rows) {
    if ((await photoFiles.read(sha256)) === null) continue
    await photoFiles.remove(sha256)
    count += 1
  }
  return count
}
