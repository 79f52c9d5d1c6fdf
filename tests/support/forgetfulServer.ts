import { readDeviceLooks } from '@/shared/api/nextLook'
import { enrolDeviceKey, pullChanges, pushMutations, readDeviceEdition, renewDevice } from '@/shared/api/sync'
import type { Endpoint, EndpointReply } from '@/shared/api/defineEndpoint'
import { mutation, type Change, type MutationOutcome } from '@/shared/schemas/sync'
import { syncDigest } from '@/shared/sync/syncDigest'
import { mutationFingerprint } from '@/shared/sync/mutationFingerprint'
import { ApiError, UnreachableError } from '@/sync/api/ApiError'
import type { ApiClient, CallInput } from '@/sync/api/createApiClient'
import { buildBeat, buildBuilding, buildSheet } from './buildFieldEntities'

export const BEAT_ID = '01980000-0000-7000-8000-0000000000b1'
export const BUILDING_ID = '01980000-0000-7000-8000-0000000000a1'

/** What goes wrong next; each is used up by one call. */
export type Mishap =
  | 'no-answer'
  | 'answer-lost'
  | 'server-fault'
  | 'too-large'
  | 'resync'
  | 'sign-in'
  | 'too-old'
  | 'fork'
  | 'shut-out'
  | 'busy'

/** A server in memory that keeps what it judged and can be told to lose answers. */
export class ForgetfulServer {
  readonly mishaps: Mishap[] = []
  readonly applied = new Map<string, string>()
  readonly order: string[] = []
  /** Ids that it refuses, with a problem. */
  readonly refused = new Set<string>()
  readonly batchSizes: number[] = []
  /** Device ids that asked to go on, in their order. */
  readonly enrolled: string[] = []
  /** Breaks the digest of so many last pages. */
  wrongDigests = 0
  beatIds: readonly string[] = [BEAT_ID]
  private readonly seqOf = new Map<string, Map<number, string>>()
  private readonly rows = new Map<string, Change>()
  private change = 0

  constructor() {
    this.put({ type: 'beat', id: BEAT_ID, change: 0, fields: buildBeat() })
    this.put({ type: 'building', id: BUILDING_ID, change: 0, fields: buildBuilding(BEAT_ID) })
  }

  put(change: Change): void {
    this.rows.set(`${change.type} ${change.id}`, { ...change, change: (this.change += 1) })
  }

  readonly api: ApiClient = {
    call: async <E extends Endpoint>(endpoint: E, input: CallInput<E> = {}): Promise<EndpointReply<E>> => {
      const mishap = this.mishaps.shift()
      const fault = mishap === undefined ? undefined : FAULTS[mishap]
      if (fault) throw fault()
      const reply = this.answer(endpoint, input)
      if (mishap === 'answer-lost') throw new UnreachableError('the answer was lost')
      return endpoint.response.parse(reply) as EndpointReply<E>
    },
    send: async () => {
      throw new UnreachableError('photos are not served here')
    },
  }

  private answer(endpoint: Endpoint, input: CallInput<Endpoint>): unknown {
    if (endpoint.path === pushMutations.path) return this.push(pushMutations.body.parse(input.body))
    if (endpoint.path === pullChanges.path) return this.pull(pullChanges.query.parse(input.query))
    if (endpoint.path === renewDevice.path) this.enrolled.push(renewDevice.body.parse(input.body).deviceId)
    if (endpoint.path === renewDevice.path) return { accessToken: 'renewed', expiresInS: 600 }
    if (endpoint.path === enrolDeviceKey.path) return this.takeKey()
    if (endpoint.path === readDeviceEdition.path) throw refusal(404, 'not-found')
    if (endpoint.path === readDeviceLooks.path) return { rounds: [] }
    throw new UnreachableError(`${endpoint.path} is not served here`)
  }

  /** How often a key came. */
  keysTaken = 0
  private takeKey() {
    this.keysTaken += 1
    return { isEnrolled: true }
  }

  private push({ deviceId, batch }: { deviceId: string; batch: unknown[] }) {
    const known = this.seqOf.get(deviceId) ?? new Map<number, string>()
    this.seqOf.set(deviceId, known)
    this.batchSizes.push(batch.length)
    const parsed = batch.map((one) => mutation.parse(one))
    for (const { seq, id } of parsed) {
      if (known.has(seq) && known.get(seq) !== id) throw refusal(409, 'sequence-fork')
    }
    const first = parsed[0]?.seq ?? 1
    if (first > known.size + 1) throw refusal(409, 'sequence-gap', known.size + 1)
    const results = parsed.map((one): MutationOutcome => {
      known.set(one.seq, one.id)
      const print = mutationFingerprint(one)
      if (this.refused.has(one.id)) {
        return { id: one.id, seq: one.seq, status: 'rejected', problem: refusal(422, 'not-in-your-beats').problem }
      }
      if (this.applied.get(one.id) === print) return { id: one.id, seq: one.seq, status: 'replay', change: this.change }
      this.applied.set(one.id, print)
      this.order.push(one.id)
      if (one.op === 'set' && one.type === 'sheet') {
        const before = this.rows.get(`sheet ${one.entity}`)
        const answers = before?.type === 'sheet' ? before.fields.answers : {}
        this.put({ type: 'sheet', id: one.entity, change: 0, fields: buildSheet(BEAT_ID, { ...answers, ...one.set }) })
      }
      return { id: one.id, seq: one.seq, status: 'applied', change: this.change }
    })
    return { results, lastSeq: known.size, serverTime: '2026-10-13T14:08:00Z', minSchema: 1 }
  }

  private pull({ deviceId, cursor }: { deviceId: string; cursor?: string | undefined }) {
    const since = Number(cursor ?? '0')
    const rows = [...this.rows.values()].sort((a, b) => a.change - b.change)
    const inScope = this.beatIds.length > 0 ? rows : []
    const digest = syncDigest(inScope)
    const isWrong = this.wrongDigests > 0
    if (isWrong) this.wrongDigests -= 1
    return {
      changes: inScope.filter(({ change }) => change > since),
      cursor: String(this.change),
      more: false,
      ackSeq: this.seqOf.get(deviceId)?.size ?? 0,
      scope: { epoch: 1, beatIds: this.beatIds },
      digest: isWrong ? { ...digest, count: digest.count + 1 } : digest,
      serverTime: '2026-10-13T14:08:00Z',
      minSchema: 1,
    }
  }
}

function refusal(status: number, code: string, expected?: number): ApiError {
  const said = { type: 'about:blank', title: code, status, code, detail: code, faults: [] }
  return new ApiError(expected === undefined ? said : { ...said, expected })
}

/** What is thrown instead of an answer; a lost answer is lost after the server did its work. */
const FAULTS: Readonly<Partial<Record<Mishap, () => Error>>> = {
  'no-answer': () => new UnreachableError('no answer'),
  'server-fault': () => refusal(500, 'server-fault'),
  'sign-in': () => refusal(401, 'sign-in-again'),
  'too-large': () => refusal(413, 'too-large'),
  'too-old': () => refusal(426, 'upgrade-required'),
  fork: () => refusal(409, 'sequence-fork'),
  'shut-out': () => refusal(403, 'device-revoked'),
  busy: () => new ApiError(refusal(503, 'busy').problem, 40),
  resync: () => refusal(410, 'resync-required'),
}
