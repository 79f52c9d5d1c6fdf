import { randomUUID } from 'node:crypto'
import type { Change, Mutation, MutationOutcome } from '@/shared/schemas/sync'
import { pullChanges, pushMutations } from '@/shared/api/sync'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { syncDigest } from '@/shared/sync/syncDigest'
import type { TestApp } from '@/tests/support/createTestApp'
import type { SignedInPerson } from '@/tests/support/signInAs'
import type { z } from 'zod'

type PushAnswer = z.output<typeof pushMutations.response>
type PullAnswer = z.output<typeof pullChanges.response>
type Draft = Pick<Mutation, 'op' | 'type' | 'entity'> & { set?: unknown; seen?: number }

/** The least a phone must do, by the rules of the protocol; bytes go through the real routes. */
export interface TestPhone {
  readonly person: SignedInPerson
  readonly base: Map<string, Change>
  readonly bag: (object & { id: string; seq: number })[]
  /** Every mutation that was ever called saved. */
  readonly saved: (object & { id: string; seq: number })[]
  readonly apart: MutationOutcome[]
  cursor: string | undefined
  save(draft: Draft): Mutation & { id: string; seq: number }
  saveSheet(sheetId: string, set: SheetAnswers): Mutation & { id: string; seq: number }
  push(batch?: readonly object[]): Promise<PushAnswer>
  pullPage(limit?: number): Promise<PullAnswer>
  pull(limit?: number): Promise<PullAnswer>
  handIn(): Promise<void>
  sheet(sheetId: string): Extract<Change, { type: 'sheet' }> | undefined
  of<Type extends Change['type']>(type: Type): Extract<Change, { type: Type }>[]
}

const key = (type: string, id: string) => `${type}/${id}`

/** @param state a copy of another phone's memory: a restored backup */
export function testPhone(testApp: TestApp, person: SignedInPerson): TestPhone {
  const base = new Map<string, Change>()
  const gone = new Map<string, number>()
  const bag: TestPhone['bag'] = []
  const saved: TestPhone['saved'] = []
  const answered = new Set<string>()
  let nextSeq = 1
  const phone: TestPhone = {
    person,
    base,
    bag,
    saved,
    apart: [],
    cursor: undefined,
    save(draft) {
      const seen =
        draft.seen ?? base.get(key(draft.type, draft.entity))?.change ?? gone.get(key(draft.type, draft.entity)) ?? 0
      const mutation = {
        id: randomUUID(),
        seq: nextSeq++,
        at: '2026-11-30T10:12:03+01:00',
        elapsedMs: 5,
        ...draft,
        seen,
      } as Mutation
      bag.push(mutation)
      saved.push(mutation)
      return mutation
    },
    saveSheet: (entity, set) => phone.save({ op: 'set', type: 'sheet', entity, set }),
    async push(batch = bag.slice(0, 500)) {
      const answer = await testApp.http
        .post('/api/v1/sync/push')
        .set(person.bearer)
        .type('json')
        .send(JSON.stringify({ deviceId: person.deviceId, schema: 1, batch }))
      if (answer.status !== 200) throw Object.assign(new Error(`push ${answer.status}`), answer.body)
      const parsed = pushMutations.response.parse(answer.body)
      for (const result of parsed.results) {
        answered.add(result.id)
        if (result.status === 'rejected' || result.status === 'blocked') phone.apart.push(result)
      }
      return parsed
    },
    async pullPage(limit = 500) {
      const answer = await testApp.http
        .get('/api/v1/sync/pull')
        .query({ deviceId: person.deviceId, schema: 1, limit, ...(phone.cursor ? { cursor: phone.cursor } : {}) })
        .set(person.bearer)
      if (answer.status !== 200) throw Object.assign(new Error(`pull ${answer.status}`), answer.body)
      const page = pullChanges.response.parse(answer.body)
      take(page)
      return page
    },
    async pull(limit) {
      for (;;) {
        const page = await phone.pullPage(limit)
        if (page.more) continue
        const kept = bag.filter(({ id, seq }) => seq > page.ackSeq || !answered.has(id))
        bag.splice(0, bag.length, ...kept)
        return page
      }
    },
    async handIn() {
      while (bag.some(({ id }) => !answered.has(id))) {
        await phone.push(bag.filter(({ id }) => !answered.has(id)).slice(0, 500))
      }
      await phone.pull()
    },
    sheet: (sheetId) => base.get(key('sheet', sheetId)) as Extract<Change, { type: 'sheet' }> | undefined,
    of: (type) => [...base.values()].filter((change) => change.type === type) as never,
  }

  function take(page: PullAnswer): void {
    for (const change of page.changes) {
      if (change.type === 'gone') {
        base.delete(key(change.of, change.id))
        gone.set(key(change.of, change.id), change.change)
        continue
      }
      const name = key(change.type, change.id)
      if ((base.get(name)?.change ?? 0) < change.change) base.set(name, change)
    }
    dropOutside(new Set(page.scope.beatIds))
    phone.cursor = page.cursor
    if (page.digest) {
      const held = syncDigest(base.values())
      if (held.count !== page.digest.count || held.xor64 !== page.digest.xor64) {
        throw new Error(`digest: holds ${held.count}, should hold ${page.digest.count}`)
      }
    }
  }

  function dropOutside(beatIds: ReadonlySet<string>): void {
    const buildings = new Set(
      [...base.values()].flatMap((change) =>
        change.type === 'building' && beatIds.has(change.fields.beatId) ? [change.id] : [],
      ),
    )
    for (const [name, change] of base) {
      const stays =
        change.type === 'beat'
          ? beatIds.has(change.id)
          : change.type === 'gone'
            ? false
            : buildings.has(buildingOf(change))
      if (!stays) base.delete(name)
    }
  }
  return phone
}

function buildingOf(change: Change): string {
  return change.type === 'photo' || change.type === 'conflict' ? change.fields.sheetId : change.id
}

/**
 * Every mutation a phone ever called saved is applied, in quarantine or in its bag, none twice; and every drained phone
 * holds what the database holds (the phone checks the digest itself at each last page).
 */
export async function assertNothingLost(testApp: TestApp, phones: readonly TestPhone[]): Promise<void> {
  for (const phone of phones) {
    const { organisationId } = phone.person
    const known = await testApp.owner.rows<{ mutation_id: string; outcome: string; is_apart: boolean }>(
      `SELECT a.mutation_id, a.outcome, q.mutation_id IS NOT NULL AS is_apart
       FROM applied_mutation a LEFT JOIN quarantine q USING (organisation_id, mutation_id)
       WHERE a.organisation_id = $organisationId`,
      { organisationId },
    )
    const setApart = await testApp.owner.rows<{ mutation_id: string }>(
      'SELECT mutation_id FROM quarantine WHERE organisation_id = $organisationId',
      { organisationId },
    )
    const apart = new Set(setApart.map(({ mutation_id }) => mutation_id))
    const byId = new Map(known.map((row) => [row.mutation_id, row]))
    for (const { id } of phone.saved) {
      const row = byId.get(id)
      const isInBag = phone.bag.some((entry) => entry.id === id)
      if (!row && !isInBag && !apart.has(id)) throw new Error(`mutation ${id} is nowhere`)
      if (row && row.outcome !== 'applied' && !row.is_apart) throw new Error(`mutation ${id} was set apart and dropped`)
    }
  }
}
