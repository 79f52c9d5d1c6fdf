import type { BagFile } from '@/shared/schemas/bagFile'
import { sealBag, type SignText } from '@/shared/sync/sealBag'
import type { Statements } from './driver.types'
import type { DraftRow, OutboxRow, PhotoRow, QuarantineRow } from './rows'

/** Whose bag it is, of which device, and how that device signs. */
export interface BagOwner {
  readonly organisationId: string
  readonly personId: string
  readonly deviceId: () => string
  readonly sign: SignText
}

/** All work that only this phone holds, word for word, with its digest and the signature of the device. */
export async function makeBagFile(inside: Statements, owner: BagOwner, now: Date): Promise<BagFile> {
  const outbox = await inside.all<OutboxRow>('SELECT * FROM outbox ORDER BY seq')
  const drafts = await inside.all<DraftRow>('SELECT * FROM draft ORDER BY building_id')
  const photos = await inside.all<PhotoRow>('SELECT * FROM photo WHERE is_removed = 0 ORDER BY photo_id')
  const refused = await inside.all<QuarantineRow>('SELECT * FROM quarantine ORDER BY mutation_id')
  const bag = {
    organisationId: owner.organisationId,
    personId: owner.personId,
    deviceId: owner.deviceId(),
    mutations: outbox.map(({ payload }): unknown => JSON.parse(payload)),
    drafts: drafts.map(({ building_id, answers, seen, kept_at }) => ({
      buildingId: building_id,
      answers: JSON.parse(answers) as unknown,
      seen,
      keptAt: kept_at,
    })),
    photos: photos.map(({ meta, place }) => ({ photo: JSON.parse(meta) as unknown, place })),
    refused: refused.map(({ payload, problem }) => ({
      mutation: JSON.parse(payload) as unknown,
      problem: JSON.parse(problem) as unknown,
    })),
  }
  return sealBag(bag, now, owner.sign)
}
