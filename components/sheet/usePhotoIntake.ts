import { useRef, useState } from 'react'
import { newId } from '@/db/newId'
import type { PhotoMeta } from '@/shared/schemas/sheet'
import { useField } from '@/sync/react/FieldProvider'
import { preparePhoto } from './preparePhoto'

/** Most photos of one sheet. */
export const MOST_PHOTOS = 12

/** What went wrong with a photo, and why; `too-many` says how many were left out. */
export type PhotoFault =
  | { readonly kind: 'unreadable' | 'not-kept' | 'not-removed'; readonly reason: string }
  | { readonly kind: 'too-many'; readonly count: number }

/** Takes pictures into a sheet one after the other, never more than twelve, and says what became of each that failed. */
export function usePhotoIntake(sheetId: string) {
  const { store } = useField()
  const [faults, setFaults] = useState<readonly PhotoFault[]>([])
  const [isBusy, setIsBusy] = useState(false)
  // a second pick waits for the first, so that both are counted
  const queue = useRef<Promise<void>>(Promise.resolve())

  const takeOne = async (file: Blob, tag: PhotoMeta['tag']): Promise<PhotoFault | null> => {
    let prepared
    try {
      prepared = await preparePhoto(file)
    } catch (error) {
      return { kind: 'unreadable', reason: reasonOf(error) }
    }
    const { bytes, ...picture } = prepared
    const takenAt = new Date().toISOString()
    try {
      await store.addPhoto({ photoId: newId(), sheetId, ...picture, bytes: bytes.length, tag, takenAt }, bytes)
      return null
    } catch (error) {
      return { kind: 'not-kept', reason: reasonOf(error) }
    }
  }
  const takeAll = async (files: readonly Blob[], tag: PhotoMeta['tag']) => {
    setIsBusy(true)
    const found: PhotoFault[] = []
    const room = await store.listPhotos(sheetId).then(
      (photos) => Math.max(0, MOST_PHOTOS - photos.length),
      () => 0,
    )
    for (const file of files.slice(0, room)) {
      const fault = await takeOne(file, tag)
      if (fault) found.push(fault)
    }
    if (files.length > room) found.push({ kind: 'too-many', count: files.length - room })
    setFaults(found)
    setIsBusy(false)
  }
  const take = (files: readonly Blob[], tag: PhotoMeta['tag']) => {
    queue.current = queue.current.then(() => takeAll(files, tag))
  }
  const remove = async (photoId: string) => {
    setFaults([])
    try {
      await store.removePhoto(photoId)
    } catch (error) {
      setFaults([{ kind: 'not-removed', reason: reasonOf(error) }])
    }
  }
  return { take, remove, faults, isBusy }
}

function reasonOf(error: unknown): string {
  return error instanceof Error ? error.message : String(error)
}
