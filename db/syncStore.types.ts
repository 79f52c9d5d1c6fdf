import type { BagFile } from '@/shared/schemas/bagFile'
import type { EditionForDevice } from '@/shared/schemas/factorBook'
import type { DeviceLooks } from '@/shared/schemas/nextLook'
import type { PhotoMeta } from '@/shared/schemas/sheet'
import type { Change, MutationOutcome } from '@/shared/schemas/sync'
import type { Problem } from '@/shared/schemas/problem'
import type { SyncDigest } from '@/shared/sync/syncDigest'

/** What handing in needs of the device's database. */
export interface SyncStore {
  /** The oldest mutations without an answer, verbatim, within both limits; one always comes, however large. */
  nextBatch(mostCount: number, mostBytes: number): Promise<readonly WaitingMutation[]>
  /** Mutations without an answer, or sent and not seen back. */
  countWaiting(): Promise<{ readonly unanswered: number; readonly unconfirmed: number; readonly photos: number }>
  /** Writes the server's answers down; refused ones move to quarantine with their content. */
  settle(outcomes: readonly MutationOutcome[]): Promise<void>
  /** Sets one mutation apart that cannot be sent at all. */
  setApart(mutationId: string, problem: Problem): Promise<void>
  hasSeq(seq: number): Promise<boolean>
  nextSeq(): Promise<number>
  /** Remembers that another device id is wanted, before anybody is asked for it; `renumber` ends it. */
  beginRenewal(): Promise<void>
  isRenewing(): Promise<boolean>
  /** Numbers what waits from 1, with the same ids; nothing of it counts as answered any more. */
  renumber(deviceId: string): Promise<void>
  /** Where pull goes on; null is from the start. */
  readCursor(): Promise<string | null>
  /** Stores a page, its cursor and its scope together; the last page of a rebuild takes the place of the rows. */
  applyPage(page: PulledPage): Promise<void>
  /** After the last page: drops from the bag what the snapshot holds and the server answered. */
  dropConfirmed(ackSeq: number, at: string): Promise<void>
  baseDigest(): Promise<SyncDigest>
  /** From now on pages are fetched from the start, beside the rows that are there until the last page came. */
  startRebuild(): Promise<void>
  nextPhotos(most: number): Promise<readonly PhotoMeta[]>
  readPhotoBytes(sha256: string): Promise<Uint8Array | null>
  markPhoto(photoId: string, place: 'sent' | 'refused', refusal: string | null): Promise<void>
  keepEdition(edition: EditionForDevice): Promise<void>
  /** Takes the place of the lists before. */
  keepNextLooks(lists: readonly DeviceLooks[]): Promise<void>
  /** Where space runs short: bytes of photos that the server has stored leave the device. @returns how many */
  evictPhotos(): Promise<number>
  /** Everything that only this phone holds, sealed. */
  makeBagFile(): Promise<BagFile>
  /** After a receipt: what waited is set apart here, and what was pulled leaves the device. */
  markSurrendered(sha256: string): Promise<void>
  /** When the bag was handed over; null when it was not, or work came since. */
  readSurrendered(): Promise<string | null>
  isKeyEnrolled(deviceId: string): Promise<boolean>
  noteKeyEnrolled(deviceId: string): Promise<void>
  subscribe(listener: () => void): () => void
}

export interface WaitingMutation {
  readonly mutationId: string
  readonly seq: number
  readonly mutation: unknown
  readonly bytes: number
}

export interface PulledPage {
  readonly changes: readonly Change[]
  readonly cursor: string
  readonly beatIds: readonly string[]
  /** No page comes after it. */
  readonly isLast: boolean
}
