import { existsSync } from 'node:fs'
import { Worker } from 'node:worker_threads'

/** A picture as it is stored: encoded by us, without metadata. */
export interface ReencodedPhoto {
  readonly jpeg: Uint8Array
  readonly thumbnail: Uint8Array
  readonly widthPx: number
  readonly heightPx: number
}

export type DecodeResult =
  { readonly photo: ReencodedPhoto } | { readonly fault: 'not-decodable' | 'took-too-long' | 'took-too-much-memory' }

export interface PhotoDecoder {
  /** Decodes one picture after the other, in a thread that is thrown away when it misbehaves. Never throws. */
  decode(bytes: Uint8Array): Promise<DecodeResult>
}

export const MOST_PIXELS = 50_000_000
export const LONGEST_STORED_PX = 2_048
export const THUMBNAIL_PX = 320

/** Beside this file in the source tree, in its folder beside the bundle. */
const WORKER = ['./photoWorker.mjs', './jobs/photoWorker.mjs']
  .map((place) => new URL(place, import.meta.url))
  .find((url) => existsSync(url))

/** Makes a decoder; its thread begins with the first picture and does not keep the process alive. */
export function createPhotoDecoder({ timeoutMs = 30_000, memoryMb = 384 } = {}): PhotoDecoder {
  let worker: Worker | undefined
  let last: Promise<unknown> = Promise.resolve()

  const startWorker = () => {
    if (!WORKER) throw new Error('the worker that looks at photos is not there')
    const started = new Worker(WORKER, { resourceLimits: { maxOldGenerationSizeMb: memoryMb } })
    started.unref()
    return started
  }
  const giveUp = () => {
    void worker?.terminate()
    worker = undefined
  }
  const runOne = (bytes: Uint8Array): Promise<DecodeResult> => {
    const current = (worker ??= startWorker())
    return new Promise((resolve) => {
      const settle = (result: DecodeResult) => {
        clearTimeout(timer)
        current.off('message', onMessage).off('error', onDeath).off('exit', onDeath)
        current.unref()
        if ('fault' in result && result.fault !== 'not-decodable') giveUp()
        resolve(result)
      }
      const onMessage = (answer: { picture?: ReencodedPhoto }) =>
        settle(answer.picture ? { photo: answer.picture } : { fault: 'not-decodable' })
      const onDeath = () => settle({ fault: 'took-too-much-memory' })
      const timer = setTimeout(() => settle({ fault: 'took-too-long' }), timeoutMs)
      current.ref()
      current.on('message', onMessage).on('error', onDeath).on('exit', onDeath)
      const copy = new Uint8Array(bytes)
      current.postMessage(
        { bytes: copy, longestPx: LONGEST_STORED_PX, thumbnailPx: THUMBNAIL_PX, mostPixels: MOST_PIXELS },
        [copy.buffer],
      )
    })
  }
  return {
    decode(bytes) {
      const turn = last.then(() => runOne(bytes))
      last = turn
      return turn
    },
  }
}
