import { randomUUID } from 'node:crypto'
import { buildOrganisation } from '@/tests/support/buildOrganisation'
import { buildPerson } from '@/tests/support/buildPerson'
import { buildBeat, buildRound, type TestRound } from '@/tests/support/buildRound'
import type { TestApp } from '@/tests/support/createTestApp'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'
import { answerOf, BAD, type HistoryEvent } from '@/tests/sync/model/history'
import { BEATS, BUILDINGS } from '@/tests/sync/model/modelDistrict'
import { RealPhone } from './realPhone'

interface RealTown {
  readonly testApp: TestApp
  readonly planner: SignedInPerson
  readonly round: TestRound
  readonly phones: readonly RealPhone[]
  readonly surveyorIds: readonly string[]
  /** Beat of the generator → its id and outlines. */
  readonly beats: Map<string, { beatId: string; surveyorId: string | null; outlineIds: string[] }>
}

/**
 * Plays a history of the model's generator on the real client core, server and database, then lets every phone sync in
 * peace and checks that nothing was lost and all phones of a person hold the same.
 *
 * @param isForgetful whether phones are broken on purpose and drop what they sent without an answer
 * @throws {Error} saying what went wrong
 */
export async function playForReal(
  testApp: TestApp,
  origin: string,
  events: readonly HistoryEvent[],
  isForgetful = false,
): Promise<void> {
  const town = await buildTown(testApp, origin)
  for (const phone of town.phones) phone.isForgetful = isForgetful
  for (const phone of town.phones) await phone.sync('ok')
  for (const happening of events) await play(town, happening)
  await drain(town)
  for (const phone of town.phones) await requireNothingLost(town, phone)
  const [one, two, three, four] = await Promise.all(town.phones.map((phone) => phone.everything()))
  if (one !== three || two !== four) throw new Error('two phones of one person hold different rows')
}

/** Everybody is let in, every app is of the server's version, and the network holds. */
async function drain(town: RealTown): Promise<void> {
  for (const personId of town.surveyorIds) await setShut(town, personId, false)
  for (const phone of town.phones) phone.isOfAnotherVersion = false
  for (let turn = 0; turn < 6; turn += 1) for (const phone of town.phones) await phone.sync('ok')
}

async function buildTown(testApp: TestApp, origin: string): Promise<RealTown> {
  const { organisationId } = await buildOrganisation(testApp)
  const planner = await signInAs(testApp, await buildPerson(testApp, { organisationId, roles: ['planner'] }))
  const people = [await buildPerson(testApp, { organisationId }), await buildPerson(testApp, { organisationId })]
  const round = await buildRound(testApp, {
    organisationId,
    createdBy: planner.personId,
    outlineCount: BUILDINGS.length,
  })
  const beats: RealTown['beats'] = new Map()
  for (const [index, name] of BEATS.entries()) {
    const mine = BUILDINGS.flatMap((_, place) => (place % 2 === index ? [place] : []))
    const surveyorId = people[index]?.personId ?? null
    const buildingIds = mine.flatMap((place) => round.buildingIds[place] ?? [])
    const { beatId } = await buildBeat(testApp, round, { surveyorId, buildingIds, name })
    beats.set(name, { beatId, surveyorId, outlineIds: mine.flatMap((place) => round.outlineIds[place] ?? []) })
  }
  const phones = []
  for (let index = 0; index < 4; index += 1) phones.push(await RealPhone.open(testApp, origin, people[index % 2]!))
  return { testApp, planner, round, phones, surveyorIds: people.map(({ personId }) => personId), beats }
}

async function play(town: RealTown, happening: HistoryEvent): Promise<void> {
  if ('phone' in happening) return playOnPhone(town, town.phones[happening.phone]!, happening)
  switch (happening.kind) {
    case 'review':
      return review(town, idOf(town, happening.building), happening.state)
    case 'settle':
      return settle(town, happening)
    case 'assign':
      return shareOut(town, happening.beat, { surveyorId: town.surveyorIds[happening.person] ?? null })
    case 'move':
      return move(town, happening)
    case 'shut':
      return setShut(town, town.surveyorIds[happening.person] ?? '', happening.isShut)
  }
}

function idOf({ round }: RealTown, name: (typeof BUILDINGS)[number]): string {
  return round.buildingIds[BUILDINGS.indexOf(name)] ?? ''
}

async function playOnPhone(
  town: RealTown,
  phone: RealPhone,
  happening: Extract<HistoryEvent, { phone: number }>,
): Promise<void> {
  switch (happening.kind) {
    case 'write':
      return write(phone, idOf(town, happening.building), happening)
    case 'delete':
    case 'undelete': {
      const entity = idOf(town, happening.building)
      return phone.save(entity, { op: happening.kind, type: 'sheet', entity })
    }
    case 'resolve':
      return resolve(phone, happening)
    case 'photo':
      return photograph(phone, idOf(town, happening.building))
    case 'upload':
      // Bytes go their own way; here only the records of photos are played.
      return
    case 'sync':
      return phone.sync(happening.fault)
    default:
      return befall(phone, happening)
  }
}

/** What happens to a phone without anybody's work. */
async function befall(
  phone: RealPhone,
  happening: Extract<HistoryEvent, { kind: 'copy' | 'restore' | 'clock' | 'version' }>,
): Promise<void> {
  switch (happening.kind) {
    case 'copy':
      return phone.keepCopy()
    case 'restore':
      return phone.restoreCopy()
    case 'version':
      phone.isOfAnotherVersion = happening.isOld
      return
    case 'clock':
      // Clocks of phones order nothing; the model turns them.
      return
  }
}

/** A value that is refused stands for itself here: the client core would not keep one. */
function write(phone: RealPhone, entity: string, { group, value }: { group: number; value: number }): Promise<void> {
  if (value === BAD) return phone.save(entity, { op: 'delete', type: 'photo', entity: randomUUID() })
  return phone.save(entity, { op: 'set', type: 'sheet', entity, set: answerOf(group, value) })
}

async function resolve(
  phone: RealPhone,
  { position, choice }: { position: number; choice: 'kept' | 'set-aside' },
): Promise<void> {
  const conflicts = await phone.base('conflict')
  const conflict = conflicts[position % Math.max(1, conflicts.length)]
  if (!conflict) return
  const change = { op: 'resolve', type: 'conflict', entity: conflict.id, set: { choice } } as const
  return phone.save(conflict.building_id ?? '', change, conflict.change_no)
}

function photograph(phone: RealPhone, sheetId: string): Promise<void> {
  const photoId = randomUUID()
  const picture = { sha256: 'ab'.repeat(32), bytes: 1_000, mime: 'image/jpeg', widthPx: 4, heightPx: 3 } as const
  const set = { photoId, sheetId, ...picture, tag: 'street-front', takenAt: '2026-10-13T14:00:00Z' } as const
  return phone.save(sheetId, { op: 'set', type: 'photo', entity: photoId, set }, 0)
}

/** All devices of a person are shut out, or let in again. */
async function setShut({ testApp }: RealTown, personId: string, isShut: boolean): Promise<void> {
  const revokedAt = isShut ? new Date() : null
  await testApp.owner.run('UPDATE device SET revoked_at = $revokedAt WHERE person_id = $personId', {
    revokedAt,
    personId,
  })
}

async function review({ testApp, planner }: RealTown, sheetId: string, state: 'checked' | 'sent-back'): Promise<void> {
  const sheet = await testApp.http.get(`/api/v1/sheets/${sheetId}`).set(planner.bearer)
  if (sheet.status === 404) return
  const { change } = sheet.body as { change: number }
  const answer =
    state === 'checked'
      ? await testApp.http
          .post('/api/v1/review/check')
          .set(planner.bearer)
          .send({ sheets: [{ sheetId, change }] })
      : await testApp.http
          .post(`/api/v1/sheets/${sheetId}/send-back`)
          .set(planner.bearer)
          .send({ question: 'why?', change })
  if (answer.status !== 200) throw new Error(`review answered ${answer.status}`)
}

async function settle(
  { testApp, planner }: RealTown,
  { position, choice }: { position: number; choice: 'kept' | 'set-aside' },
): Promise<void> {
  const open = await testApp.owner.rows<{ conflict_id: string }>(
    `SELECT conflict_id FROM conflict WHERE organisation_id = $organisationId AND state = 'open' ORDER BY change_no`,
    { organisationId: planner.organisationId },
  )
  const conflict = open[position % Math.max(1, open.length)]
  if (!conflict) return
  const path = `/api/v1/conflicts/${conflict.conflict_id}/settle`
  const answer = await testApp.http.post(path).set(planner.bearer).send({ choice })
  if (answer.status !== 200) throw new Error(`settling answered ${answer.status}`)
}

async function move(town: RealTown, { building, beat }: Extract<HistoryEvent, { kind: 'move' }>): Promise<void> {
  const outlineId = town.round.outlineIds[BUILDINGS.indexOf(building)] ?? ''
  for (const other of town.beats.values()) {
    if (!other.outlineIds.includes(outlineId)) continue
    other.outlineIds = other.outlineIds.filter((id) => id !== outlineId)
  }
  if (beat !== null) {
    town.beats.get(beat)?.outlineIds.push(outlineId)
    return shareOut(town, beat, {})
  }
  for (const name of BEATS) await shareOut(town, name, {})
}

async function shareOut(town: RealTown, name: string, change: { surveyorId?: string | null }): Promise<void> {
  const beat = { ...town.beats.get(name)!, ...change }
  town.beats.set(name, beat)
  const { beatId, surveyorId, outlineIds } = beat
  const answer = await town.testApp.http
    .put(`/api/v1/rounds/${town.round.roundId}/beats/${beatId}`)
    .set(town.planner.bearer)
    .send({ name, surveyorId, outlineIds })
  if (answer.status !== 200) throw new Error(`sharing out answered ${answer.status}`)
}

async function requireNothingLost({ testApp, planner }: RealTown, phone: RealPhone): Promise<void> {
  const rows = await testApp.owner.rows<{ mutation_id: string; outcome: string; is_apart: boolean }>(
    `SELECT a.mutation_id, a.outcome, q.mutation_id IS NOT NULL AS is_apart
     FROM applied_mutation a LEFT JOIN quarantine q USING (organisation_id, mutation_id)
     WHERE a.organisation_id = $organisationId`,
    { organisationId: planner.organisationId },
  )
  const known = new Map(rows.map((row) => [row.mutation_id, row]))
  if ((await phone.bagIds()).length > 0) throw new Error('the bag is not empty')
  for (const { id } of phone.saved) {
    const row = known.get(id)
    if (!row && !phone.wiped.has(id)) throw new Error(`${id} is lost`)
    if (row && row.outcome !== 'applied' && !row.is_apart) throw new Error(`${id} was set apart and dropped`)
  }
}
