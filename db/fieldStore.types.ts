import type { EditionForDevice } from '@/shared/schemas/factorBook'
import type { DeviceLooks } from '@/shared/schemas/nextLook'
import type { DeviceSheetState, PhotoMeta, SheetAnswers } from '@/shared/schemas/sheet'
import type { BeatEntity, BuildingEntity, ConflictEntity, PhotoEntity, SheetEntity } from '@/shared/schemas/sync'
import type { Problem } from '@/shared/schemas/problem'

/** What a surveyor sees of the device's database. Everything answers from the device, never from the network. */
export interface FieldStore {
  listBeats(): Promise<readonly StoredBeat[]>
  /** All buildings of a beat with the state of their sheets, for map, list and wall. */
  listBuildings(beatId: string): Promise<readonly StoredBuilding[]>
  readBuilding(buildingId: string): Promise<StoredBuilding | null>
  /** The sheet as it stands here: what the server confirmed, then the bag, then the draft, group by group. */
  readSheet(buildingId: string): Promise<StoredSheet | null>
  /** Keeps one change of a form at once. The draft is what the surveyor changed since the sheet was last put in the bag. */
  keepDraft(buildingId: string, draft: SheetAnswers): Promise<{ keptAt: string }>
  /**
   * Puts the draft in the bag: outbox mutation, sequence number and removal of the draft in one transaction.
   * @throws {Error} with the fault of the disk; the draft is untouched then
   */
  putInBag(buildingId: string): Promise<void>
  /**
   * Takes a photo into the device: bytes by digest, meta and outbox mutation in one transaction.
   * @throws {NoRoomForPhotosError} what room there is stays for records
   */
  addPhoto(photo: PhotoMeta, bytes: Uint8Array): Promise<void>
  removePhoto(photoId: string): Promise<void>
  listPhotos(sheetId: string): Promise<readonly StoredPhoto[]>
  readPhotoBytes(sha256: string): Promise<Uint8Array | null>
  readBag(): Promise<BagContents>
  /** Everything that is not yet confirmed, as one JSON text with its digest and signature, for a file. */
  exportBag(): Promise<{ fileName: string; json: string }>
  /** Pairs of answers between which nobody has chosen yet, here or at the desk. */
  listConflicts(): Promise<readonly StoredConflict[]>
  /** Puts a choice in the bag; does nothing for a conflict that is settled or has a choice in the bag. */
  settleConflict(conflictId: string, choice: 'kept' | 'set-aside'): Promise<void>
  readEdition(): Promise<EditionForDevice | null>
  /** Where to look next, by round; empty until the server has told. */
  readNextLooks(): Promise<readonly DeviceLooks[]>
  /** Called after every change of any of the above. */
  subscribe(listener: () => void): () => void
}

export interface StoredBeat {
  readonly beatId: string
  readonly beat: BeatEntity
}

export interface StoredBuilding {
  readonly buildingId: string
  readonly building: BuildingEntity
  readonly state: DeviceSheetState
  readonly question: string | null
  readonly photoCount: number
  /** Answers as they stand here, merged; empty when nothing is recorded. */
  readonly answers: SheetAnswers
}

export interface StoredSheet {
  readonly building: StoredBuilding
  /** As confirmed by the server; null when it has none. */
  readonly confirmed: SheetEntity | null
  readonly draft: SheetAnswers
  readonly keptAt: string | null
  /** Revision this draft will become: 1, 2, 3 … */
  readonly nextRevision: number
  readonly conflicts: readonly (ConflictEntity & { readonly conflictId: string })[]
}

/** Two answers to one question; what lost was set aside until a person chooses. */
export interface StoredConflict extends ConflictEntity {
  readonly conflictId: string
  /** Reference and address of the building. */
  readonly label: string
}

/** So little space is left on the device that photos would take that of records. */
export class NoRoomForPhotosError extends Error {
  override readonly name = 'NoRoomForPhotosError'

  constructor() {
    super('less than 5 % of the space is left; it is kept for sheets. Hand in to free space, then take the photo again')
  }
}

export interface StoredPhoto {
  readonly photo: PhotoMeta
  /** kept here · sent · confirmed */
  readonly place: Place
  readonly state: PhotoEntity['state']
  readonly refusal: string | null
}

/** Three facts: on this device only, received by the server, seen back from the server. */
export type Place = 'kept-here' | 'sent' | 'confirmed'

export interface BagEntry {
  readonly mutationId: string
  readonly kind: 'sheet' | 'photo'
  readonly buildingId: string
  readonly label: string
  readonly place: Place
  readonly putInAt: string
  readonly bytes: number
}

export interface BagContents {
  readonly entries: readonly BagEntry[]
  readonly sheetCount: number
  readonly photoCount: number
  readonly photoBytes: number
  /** Refused by the server and set apart, never dropped. */
  readonly quarantined: readonly {
    readonly mutationId: string
    readonly label: string
    readonly problem: Problem
    readonly buildingId: string
  }[]
  readonly startedCount: number
  readonly lastHandedInAt: string | null
}
