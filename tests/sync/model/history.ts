import fc from 'fast-check'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import type { Break, ModelMutation } from './model.types'
import { FAULTS, ModelPhone } from './modelPhone'
import { BEATS, BUILDINGS } from './modelDistrict'
import { ModelServer } from './modelServer'

/** A value that the server refuses. */
export const BAD = 13
const phone = fc.nat(3)
const building = fc.constantFrom(...BUILDINGS)
const choice = fc.constantFrom('kept' as const, 'set-aside' as const)

/** What can happen in a district on a bad day. */
const event = fc.oneof(
  {
    weight: 8,
    arbitrary: fc.record({ kind: fc.constant('write' as const), phone, building, group: fc.nat(3), value: fc.nat(14) }),
  },
  {
    weight: 1,
    arbitrary: fc.record({ kind: fc.constantFrom('delete' as const, 'undelete' as const), phone, building }),
  },
  { weight: 1, arbitrary: fc.record({ kind: fc.constant('resolve' as const), phone, position: fc.nat(3), choice }) },
  {
    weight: 8,
    arbitrary: fc.record({
      kind: fc.constant('sync' as const),
      phone,
      fault: fc.constantFrom('ok' as const, ...FAULTS),
      limit: fc.integer({ min: 1, max: 4 }),
    }),
  },
  { weight: 2, arbitrary: fc.record({ kind: fc.constantFrom('copy' as const, 'restore' as const), phone }) },
  {
    weight: 1,
    arbitrary: fc.record({ kind: fc.constant('clock' as const), phone, byMs: fc.integer({ min: -1e6, max: 1e6 }) }),
  },
  { weight: 2, arbitrary: fc.record({ kind: fc.constantFrom('photo' as const, 'upload' as const), phone, building }) },
  { weight: 1, arbitrary: fc.record({ kind: fc.constant('version' as const), phone, isOld: fc.boolean() }) },
  { weight: 1, arbitrary: fc.record({ kind: fc.constant('shut' as const), person: fc.nat(1), isShut: fc.boolean() }) },
  {
    weight: 1,
    arbitrary: fc.record({
      kind: fc.constant('review' as const),
      building,
      state: fc.constantFrom('checked' as const, 'sent-back' as const),
    }),
  },
  { weight: 1, arbitrary: fc.record({ kind: fc.constant('settle' as const), position: fc.nat(3), choice }) },
  {
    weight: 1,
    arbitrary: fc.record({ kind: fc.constant('assign' as const), beat: fc.constantFrom(...BEATS), person: fc.nat(1) }),
  },
  {
    weight: 1,
    arbitrary: fc.record({ kind: fc.constant('move' as const), building, beat: fc.constantFrom(...BEATS, null) }),
  },
)
export type HistoryEvent = typeof event extends fc.Arbitrary<infer Value> ? Value : never

/** `size: 'max'`: by default lists stay near ten entries, and that hides faults. */
export function historyOf(maxLength: number) {
  return fc.array(event, { minLength: 1, maxLength, size: 'max' })
}

/**
 * Plays a history, then lets every phone sync in peace, and checks that nothing was lost, nothing done twice, and all
 * phones hold what the server holds.
 *
 * @throws {Error} saying what went wrong
 */
export function playHistory(events: readonly HistoryEvent[], broken: Break | null = null): void {
  const server = new ModelServer(broken)
  const phones = [0, 1, 2, 3].map((index) => new ModelPhone(`d${index}`, `p${index % 2}`, broken))
  for (const one of phones) one.sync(server, 'ok', 3)
  for (const happening of events) {
    for (const one of phones) one.clockMs += 1_000
    play(server, phones, happening)
    for (const one of phones) requireStillThere(server, one)
  }
  drain(server, phones)
  requirePhotos(server, phones)
  for (const one of phones) {
    requireSettled(server, one)
    requireAccountedFor(server, one)
    requireOrder(server, one)
  }
  if (new Set(server.effects).size !== server.effects.length) throw new Error('a mutation had two effects')
}

const MOST_TURNS = 40

/** Every phone syncs in peace until every bag is empty, and once more to see what the others did. */
function drain(server: ModelServer, phones: readonly ModelPhone[]): void {
  server.shut.clear()
  for (const one of phones) one.isOld = false
  for (let turn = 0; turn < MOST_TURNS && phones.some(({ memory }) => memory.bag.length > 0); turn += 1) {
    for (const one of phones) one.sync(server, 'ok', 3)
  }
  for (const one of phones) one.upload(server)
  for (const one of phones) one.sync(server, 'ok', 3)
}

/** Every photo whose record counts is stored. */
function requirePhotos(server: ModelServer, phones: readonly ModelPhone[]): void {
  const applied = new Set(server.effects)
  const wanted = phones.flatMap(({ saved, wiped }) =>
    saved.flatMap(({ id, act }) => (act.kind === 'photo' && applied.has(id) && !wiped.has(id) ? [act.photoId] : [])),
  )
  for (const photoId of wanted) {
    if (server.district.photos.get(photoId)?.state !== 'stored') throw new Error(`${photoId} is not stored`)
  }
}

function play(server: ModelServer, phones: readonly ModelPhone[], happening: HistoryEvent): void {
  if ('phone' in happening) return playOnPhone(server, phones[happening.phone]!, happening)
  switch (happening.kind) {
    case 'review':
      return server.review(happening.building, happening.state)
    case 'settle':
      return server.settle(happening.position, happening.choice)
    case 'assign':
      return server.district.assign(happening.beat, `p${happening.person}`)
    case 'move':
      return server.district.move(happening.building, happening.beat)
    case 'shut':
      return server.setShut(`p${happening.person}`, happening.isShut)
  }
}

function playOnPhone(server: ModelServer, one: ModelPhone, happening: Extract<HistoryEvent, { phone: number }>): void {
  switch (happening.kind) {
    case 'write': {
      const { building: sheetId, group, value } = happening
      return one.save(sheetId, { kind: 'set', set: answerOf(group, value), isBad: value === BAD })
    }
    case 'delete':
    case 'undelete':
      return one.save(happening.building, { kind: happening.kind })
    case 'resolve':
      return resolve(one, happening)
    case 'photo':
      return one.save(happening.building, { kind: 'photo', photoId: `f${one.name}:${one.saved.length}` })
    case 'upload':
      return upload(server, one)
    case 'sync':
      return syncAsAllowed(server, one, happening)
    default:
      return befall(one, happening)
  }
}

/** What happens to a phone without anybody's work. */
function befall(
  one: ModelPhone,
  happening: Extract<HistoryEvent, { kind: 'copy' | 'restore' | 'clock' | 'version' }>,
): void {
  switch (happening.kind) {
    case 'copy':
      return one.keepCopy()
    case 'restore':
      return one.restoreCopy()
    case 'version':
      one.isOld = happening.isOld
      return
    case 'clock':
      one.clockMs += happening.byMs
  }
}

/** Bytes alone make no photo. */
function upload(server: ModelServer, one: ModelPhone): void {
  const before = server.district.photos.size
  one.upload(server)
  if (server.district.photos.size > before) throw new Error('a photo came before its record')
}

/** Whoever is shut out, or has an app that is too old, has no effect. */
function syncAsAllowed(
  server: ModelServer,
  one: ModelPhone,
  { fault, limit }: Extract<HistoryEvent, { kind: 'sync' }>,
): void {
  const before = server.effects.length
  one.sync(server, fault, limit)
  const isRefused = one.isOld || server.shut.has(one.personId)
  if (isRefused && server.effects.length > before) throw new Error(`work of ${one.name} was taken though it is refused`)
}

function resolve(
  one: ModelPhone,
  { position, choice: made }: { position: number; choice: 'kept' | 'set-aside' },
): void {
  const conflicts = [...one.memory.base.values()].filter(({ type }) => type === 'conflict')
  const conflict = conflicts[position % Math.max(1, conflicts.length)]
  if (conflict) one.save(conflict.buildingId, { kind: 'resolve', conflictId: conflict.id, choice: made }, conflict)
}

export function answerOf(group: number, value: number): SheetAnswers {
  if (group === 0) return { storeys: { aboveGround: value + 1, knownBy: 'seen' } }
  if (group === 1) return { footprint: { footprintM2: value + 1, knownBy: 'guessed' } }
  if (group === 2) return { notes: { text: `note ${value}` } }
  return { attic: { floorShare: value / 20, knownBy: 'seen' } }
}

/** What was saved shows until something newer of the sheet has come: in the bag, or in what was pulled. */
function requireStillThere(server: ModelServer, one: ModelPhone): void {
  const inBag = new Set(one.memory.bag.map(({ id }) => id))
  for (const mutation of one.saved.slice(one.savedBeforeRestore)) {
    if (!inBag.has(mutation.id) && !one.wiped.has(mutation.id)) requireShown(server, one, mutation)
  }
}

function requireShown(server: ModelServer, one: ModelPhone, { id, sheetId, act }: ModelMutation): void {
  const judged = server.judged.get(id)
  if (!judged) throw new Error(`${id} left the bag unjudged`)
  const isHere = one.row('building', sheetId) !== undefined && !one.memory.gone.has(`sheet/${sheetId}`)
  const shown = (act.kind === 'photo' ? one.row('photo', act.photoId) : one.row('sheet', sheetId))?.change ?? 0
  const isMissing = judged.status === 'applied' && shown < judged.change
  if (isHere && isMissing && act.kind !== 'resolve') throw new Error(`${id} vanished from the screen`)
}

function requireSettled(server: ModelServer, one: ModelPhone): void {
  if (one.memory.bag.length > 0) throw new Error(`${one.name} has ${one.memory.bag.length} entries in its bag`)
  const wanted = new Map(server.district.heldBy(one.personId).map((row) => [`${row.type}/${row.id}`, row.text]))
  const held = new Map([...one.memory.base].map(([name, row]) => [name, row.text]))
  if (wanted.size !== held.size) throw new Error(`${one.name} holds ${held.size} rows of ${wanted.size}`)
  for (const [name, text] of wanted) if (held.get(name) !== text) throw new Error(`${one.name} differs in ${name}`)
}

function requireAccountedFor(server: ModelServer, one: ModelPhone): void {
  const applied = new Set(server.effects)
  for (const { id } of one.saved) {
    const isApart = server.quarantine.has(id)
    if (!applied.has(id) && !isApart && !one.wiped.has(id)) throw new Error(`${id} is lost`)
  }
}

/** The work of one phone has its effects in the order in which it was saved. */
function requireOrder(server: ModelServer, one: ModelPhone): void {
  const position = new Map(one.saved.map(({ id }, index) => [id, index]))
  const order = server.effects.flatMap((id) => position.get(id) ?? [])
  if (order.some((index, at) => index < (order[at - 1] ?? 0)))
    throw new Error(`work of ${one.name} was taken out of order`)
}
