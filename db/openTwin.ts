import * as FileSystem from 'expo-file-system/legacy'
import { BALLAST_BYTES, type Twin } from './twin.types'
import { readTwinTexts, toTwinText } from './twinText'

/** The twin of one person's bag: a file a mutation, beside the database. */
export async function openTwin(name: string): Promise<Twin> {
  const root = `${FileSystem.documentDirectory ?? ''}${name}-twin/`
  const folder = `${root}entries/`
  await FileSystem.makeDirectoryAsync(folder, { intermediates: true })
  const generationFile = `${root}generation`
  const ballastFile = `${root}ballast`
  const isThere = async (file: string) => (await FileSystem.getInfoAsync(file)).exists
  return {
    async put(entries) {
      for (const entry of entries) await FileSystem.writeAsStringAsync(folder + entry.mutationId, toTwinText(entry))
    },
    async all() {
      const names = await FileSystem.readDirectoryAsync(folder)
      return readTwinTexts(await Promise.all(names.map((file) => FileSystem.readAsStringAsync(folder + file))))
    },
    async keepOnly(mutationIds) {
      for (const file of await FileSystem.readDirectoryAsync(folder)) {
        if (!mutationIds.has(file)) await FileSystem.deleteAsync(folder + file, { idempotent: true })
      }
    },
    async readGeneration() {
      return (await isThere(generationFile)) ? Number(await FileSystem.readAsStringAsync(generationFile)) : 0
    },
    writeGeneration: (generation) => FileSystem.writeAsStringAsync(generationFile, String(generation)),
    async holdBallast() {
      if (!(await isThere(ballastFile))) await FileSystem.writeAsStringAsync(ballastFile, '#'.repeat(BALLAST_BYTES))
    },
    async dropBallast() {
      if (!(await isThere(ballastFile))) return false
      await FileSystem.deleteAsync(ballastFile, { idempotent: true })
      return true
    },
  }
}
