import { z } from 'zod'
import { crc32 } from './crc32'
import type { TwinEntry } from './twin.types'

const line = z.object({
  crc: z.number(),
  entry: z.object({
    mutationId: z.string(),
    seq: z.number(),
    buildingId: z.string(),
    putInAt: z.string(),
    payload: z.string(),
  }),
})

/** An entry with its check sum, as text. */
export function toTwinText(entry: TwinEntry): string {
  return JSON.stringify({ crc: crc32(JSON.stringify(entry)), entry })
}

/** @returns null for what was cut, changed or is no entry */
export function fromTwinText(text: unknown): TwinEntry | null {
  if (typeof text !== 'string') return null
  try {
    const { crc, entry } = line.parse(JSON.parse(text))
    return crc === crc32(JSON.stringify(entry)) ? entry : null
  } catch {
    return null
  }
}

/** Entries of texts that are whole, in the order of their numbers. */
export function readTwinTexts(texts: readonly unknown[]): TwinEntry[] {
  return texts.flatMap((text) => fromTwinText(text) ?? []).sort((one, other) => one.seq - other.seq)
}
