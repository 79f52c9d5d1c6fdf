import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { declareUpload } from '@/shared/api/sync'
import type { Endpoint, EndpointReply } from '@/shared/api/defineEndpoint'
import { BUILDING_ID } from '@/tests/support/forgetfulServer'
import { memoryPhone, type MemoryPhone } from '@/tests/support/memoryPhone'
import { ApiError, UnreachableError } from './api/ApiError'
import type { ApiClient, CallInput } from './api/createApiClient'
import { uploadPhotos } from './uploadPhotos'

type Fault = (offset: number) => void

const digestOf = (bytes: Uint8Array, form: 'hex' | 'base64') => createHash('sha256').update(bytes).digest(form)

function refusal(status: number, code: string, expected?: number): ApiError {
  const said = { type: 'about:blank', title: code, status, code, detail: code, faults: [] }
  return new ApiError(expected === undefined ? said : { ...said, expected })
}

/** Takes photos in pieces as the rules say, and can be told to fail. */
class PhotoServer {
  readonly arrived = new Map<string, Uint8Array>()
  readonly declared = new Map<string, number>()
  /** Thrown before the next pieces are taken. */
  readonly before: Fault[] = []
  /** Thrown after the next pieces were taken. */
  readonly after: Fault[] = []
  readonly broken = new Set<string>()
  pieces = 0

  readonly api: ApiClient = {
    call: async <E extends Endpoint>(endpoint: E, input: CallInput<E> = {}): Promise<EndpointReply<E>> => {
      const { photoId, bytes } = declareUpload.body.parse(input.body)
      if (this.broken.has(photoId)) throw refusal(409, 'offset-conflict')
      this.declared.set(photoId, bytes)
      return endpoint.response.parse(this.progressOf(photoId)) as EndpointReply<E>
    },
    send: async (_method, path, { body, headers = {} } = {}) => {
      const photoId = path.split('/').at(-1) ?? ''
      const piece = new Uint8Array(await new Response(body ?? null).arrayBuffer())
      const offset = Number(headers['Upload-Offset'])
      const held = this.arrived.get(photoId) ?? new Uint8Array()
      this.before.shift()?.(offset)
      if (headers['Upload-Checksum'] !== `sha256 ${digestOf(piece, 'base64')}`) throw refusal(422, 'checksum-wrong')
      if (offset !== held.length) throw refusal(409, 'offset-conflict', held.length)
      this.arrived.set(photoId, new Uint8Array([...held, ...piece]))
      this.pieces += 1
      this.after.shift()?.(offset)
      return Response.json(this.progressOf(photoId))
    },
  }

  private progressOf(photoId: string) {
    const offset = this.arrived.get(photoId)?.length ?? 0
    return { state: offset === this.declared.get(photoId) ? 'stored' : 'partial', offset }
  }
}

/** Takes a photo whose record the server has answered. */
async function takePhoto(phone: MemoryPhone, length: number): Promise<{ photoId: string; bytes: Uint8Array }> {
  const photoId = phone.nextId()
  const bytes = Uint8Array.from({ length }, (_, position) => (position * 31 + photoId.length) % 251)
  const photo = { photoId, sheetId: BUILDING_ID, sha256: digestOf(bytes, 'hex'), bytes: length }
  const size = { widthPx: 4, heightPx: 3, mime: 'image/jpeg' as const, tag: 'rear' as const, takenAt: null }
  await phone.field.addPhoto({ ...photo, ...size }, bytes)
  const batch = await phone.sync.nextBatch(10, 1e6)
  await phone.sync.settle(batch.map(({ mutationId, seq }) => ({ id: mutationId, seq, status: 'applied', change: 1 })))
  return { photoId, bytes }
}

const send = (phone: MemoryPhone, { api }: PhotoServer) =>
  uploadPhotos({ store: phone.sync, api, onProgress: () => {} })

async function placesOf(phone: MemoryPhone) {
  return (await phone.field.listPhotos(BUILDING_ID)).map(({ place }) => place)
}

describe('uploadPhotos', () => {
  it('U3 sends a photo in pieces of at most 256 KiB and keeps its bytes', async () => {
    const phone = await memoryPhone()
    const server = new PhotoServer()
    const { photoId, bytes } = await takePhoto(phone, 600_000)

    await send(phone, server)

    expect(server.pieces).toBe(3)
    expect(digestOf(server.arrived.get(photoId) ?? new Uint8Array(), 'hex')).toBe(digestOf(bytes, 'hex'))
    expect(await placesOf(phone)).toEqual(['sent'])
    expect(await phone.field.readPhotoBytes(digestOf(bytes, 'hex'))).toEqual(bytes)
  })

  it('U1 does not send a photo whose record has no answer', async () => {
    const phone = await memoryPhone()
    const server = new PhotoServer()
    const photo = { photoId: phone.nextId(), sheetId: BUILDING_ID, sha256: 'a'.repeat(64), bytes: 3, widthPx: 4 }
    await phone.field.addPhoto(
      { ...photo, heightPx: 3, mime: 'image/jpeg', tag: 'rear', takenAt: null },
      new Uint8Array([1, 2, 3]),
    )

    await send(phone, server)

    expect(server.declared.size).toBe(0)
  })

  it('U2 goes on where the answer to a piece was lost', async () => {
    const phone = await memoryPhone()
    const server = new PhotoServer()
    const { photoId, bytes } = await takePhoto(phone, 600_000)
    server.after.push(() => {
      throw new UnreachableError('the answer was lost')
    })

    await expect(send(phone, server)).rejects.toThrow(UnreachableError)
    expect(await placesOf(phone)).toEqual(['kept-here'])
    await send(phone, server)

    expect(server.pieces).toBe(3)
    expect(server.arrived.get(photoId)).toEqual(bytes)
  })

  it('U3 sends a damaged piece again, and goes on from the offset that the server has', async () => {
    const phone = await memoryPhone()
    const server = new PhotoServer()
    const { photoId, bytes } = await takePhoto(phone, 300_000)
    server.before.push(
      () => {
        throw refusal(422, 'checksum-wrong')
      },
      () => {
        throw refusal(409, 'offset-conflict', 0)
      },
    )

    await send(phone, server)

    expect(server.arrived.get(photoId)).toEqual(bytes)
  })

  it('sends the others when one photo fails, and says so at the end', async () => {
    const phone = await memoryPhone()
    const server = new PhotoServer()
    const first = await takePhoto(phone, 1_000)
    const second = await takePhoto(phone, 2_000)
    server.broken.add(first.photoId)

    await expect(send(phone, server)).rejects.toThrow('409 offset-conflict')

    expect(server.arrived.get(second.photoId)).toEqual(second.bytes)
    expect((await phone.sync.countWaiting()).photos).toBe(1)
  })
})
