import { toProblem, Refusal } from '@/server/errors'
import type { Fault, Problem } from '@/shared/schemas/problem'
import type { Mutation, PhotoMutation, SheetMutation } from '@/shared/schemas/sync'
import { mergeChoice } from '@/shared/sync/mergeChoice'
import { mergeDeletion, mergeUndeletion } from '@/shared/sync/mergeDeletion'
import { mergeSheet } from '@/shared/sync/mergeSheet'
import type { Writing } from '@/shared/sync/sheetRecord.types'
import type { BatchDraft } from './batchDraft'

/** What became of one mutation. */
export type MutationVerdict =
  | {
      readonly outcome: 'applied'
      readonly change: number
      readonly conflicts: readonly string[]
      readonly notice?: Problem
    }
  | { readonly outcome: 'rejected' | 'blocked'; readonly problem: Problem }

type DeleteMutation = Extract<Mutation, { op: 'delete' | 'undelete' }>
type ResolveMutation = Extract<Mutation, { op: 'resolve' }>

/** Applies one usable mutation to the draft of its batch, or says why not. Writes nothing yet. */
export function applyMutation(draft: BatchDraft, mutation: Mutation): MutationVerdict {
  switch (mutation.op) {
    case 'resolve':
      return applyResolution(draft, mutation)
    case 'delete':
    case 'undelete':
      return mutation.type === 'sheet' ? applySheetDeletion(draft, mutation) : applyPhotoDeletion(draft, mutation)
    case 'set':
      return mutation.type === 'sheet' ? applySheet(draft, mutation) : applyPhoto(draft, mutation)
  }
}

function applySheet(draft: BatchDraft, { entity, set, seen }: SheetMutation): MutationVerdict {
  const building = draft.building(entity)
  if (!building) return notInYourBeats()
  const writing = writingOf(draft, seen)
  const before = draft.sheet(entity)
  const merged = mergeSheet(before?.record ?? null, set, writing)
  const conflicts = draft.writeSheet(entity, building, merged, writing)
  return { outcome: 'applied', change: draft.sheet(entity)?.change ?? writing.change, conflicts }
}

function applySheetDeletion(draft: BatchDraft, { id, entity, op, seen }: DeleteMutation): MutationVerdict {
  const building = draft.building(entity)
  if (!building) return notInYourBeats()
  const before = draft.sheet(entity)
  if (!before) return nothingThere(draft, id, entity)
  const writing = writingOf(draft, seen)
  const merged = op === 'delete' ? mergeDeletion(before.record, writing) : mergeUndeletion(before.record)
  const conflicts = draft.writeSheet(entity, building, merged, writing)
  return { outcome: 'applied', change: draft.sheet(entity)?.change ?? writing.change, conflicts }
}

function applyPhoto(draft: BatchDraft, { entity, set }: PhotoMutation): MutationVerdict {
  if (entity !== set.photoId) {
    return rejected('mutation-not-usable', 'A photo goes by its own number. This entry is set apart.', [
      { pointer: '/set/photoId', code: 'not-the-entity', detail: 'must be the same as the entity' },
    ])
  }
  const building = draft.building(set.sheetId)
  if (!building) return notInYourBeats()
  const rejectedMaker = draft.rejectedMakers.get(set.sheetId)
  if (rejectedMaker !== undefined && !draft.sheet(set.sheetId)) return blockedBy(rejectedMaker)
  if (!isOwnPhoto(draft, set)) return photoDiffers()
  const change = draft.takeChange()
  draft.photoWrites.set(entity, { ...set, beatId: building.beatId, change })
  draft.photoMarks.delete(entity)
  return { outcome: 'applied', change, conflicts: [] }
}

/** Nobody else's, and the same picture of the same sheet, if there is one under this number already. */
function isOwnPhoto(draft: BatchDraft, { photoId, sheetId, sha256, bytes }: PhotoMutation['set']): boolean {
  const before = draft.photo(photoId)
  if (!before) return true
  const isSame = before.sheetId === sheetId && before.sha256 === sha256 && before.bytes === bytes
  return isSame && before.takenBy === draft.sender.personId
}

function applyPhotoDeletion(draft: BatchDraft, { id, entity, op }: DeleteMutation): MutationVerdict {
  const photo = draft.photo(entity)
  if (!photo) return nothingThere(draft, id, entity)
  if (photo.takenBy !== draft.sender.personId && !draft.building(photo.sheetId)) return notInYourBeats()
  const isDeleted = op === 'delete'
  if (photo.isDeleted === isDeleted) return { outcome: 'applied', change: photo.change, conflicts: [] }
  const change = draft.takeChange()
  draft.photoMarks.set(entity, { isDeleted, change })
  return { outcome: 'applied', change, conflicts: [] }
}

function applyResolution(draft: BatchDraft, { entity, set, seen }: ResolveMutation): MutationVerdict {
  const conflict = draft.conflict(entity)
  const building = conflict && draft.building(conflict.sheetId)
  const before = conflict && draft.sheet(conflict.sheetId)
  if (!conflict || !building || !before) return conflictUnknown()
  if (!conflict.isOpen) return { outcome: 'applied', change: conflict.change, conflicts: [], notice: ALREADY_SETTLED }
  const writing = writingOf(draft, seen)
  const merged = mergeChoice(before.record, { ...conflict, choice: set.choice }, writing)
  const conflicts = draft.writeSheet(conflict.sheetId, building, merged, writing)
  const change = draft.takeChange()
  draft.settled.set(entity, change)
  return { outcome: 'applied', change, conflicts }
}

function writingOf(draft: BatchDraft, seen: number): Writing {
  return { deviceId: draft.sender.deviceId, seen, change: draft.takeChange() }
}

/** What is not there cannot be deleted; it waits when its making was rejected. */
function nothingThere(draft: BatchDraft, id: string, entity: string): MutationVerdict {
  const maker = draft.rejectedMakers.get(entity)
  if (maker !== undefined && maker !== id) return blockedBy(maker)
  return rejected('nothing-there', 'What this entry deletes is not on the server. The entry is set apart.')
}

function rejected(code: string, detail: string, faults: readonly Fault[] = []): MutationVerdict {
  return { outcome: 'rejected', problem: toProblem(new Refusal(422, code, detail, faults)) }
}

function blockedBy(mutationId: string): MutationVerdict {
  const detail =
    'This entry belongs to one that was set apart before it. It is set apart with it; mend the first, then send both again.'
  const faults = [{ pointer: '/entity', code: 'waits-for', detail: mutationId }]
  return { outcome: 'blocked', problem: toProblem(new Refusal(409, 'blocked', detail, faults)) }
}

const notInYourBeats = (): MutationVerdict => ({
  outcome: 'rejected',
  problem: toProblem(
    new Refusal(
      403,
      'not-in-your-beats',
      'This building is not in your beats (any more). The entry is set apart with all it says; ask your planner.',
    ),
  ),
})
const photoDiffers = () =>
  rejected('photo-differs', 'There is another photo under this number. The entry is set apart; take the photo again.')
const conflictUnknown = () =>
  rejected('conflict-unknown', 'There is no such conflict in your beats. The entry is set apart; nothing was changed.')
const ALREADY_SETTLED = toProblem(
  new Refusal(200, 'already-settled', 'Somebody settled this before you. What they chose stays.'),
)
