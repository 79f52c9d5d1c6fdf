import type { Twin } from '@/db/twin.types'
import { readTwinTexts, toTwinText } from '@/db/twinText'

export interface MemoryTwin extends Twin {
  readonly texts: Map<string, string>
  readonly hasBallast: () => boolean
}

/** A twin in memory. */
export function memoryTwin(): MemoryTwin {
  const texts = new Map<string, string>()
  let generation = 0
  let hasBallast = false
  return {
    texts,
    hasBallast: () => hasBallast,
    async put(entries) {
      for (const entry of entries) texts.set(entry.mutationId, toTwinText(entry))
    },
    all: async () => readTwinTexts([...texts.values()]),
    async keepOnly(mutationIds) {
      for (const id of [...texts.keys()]) if (!mutationIds.has(id)) texts.delete(id)
    },
    readGeneration: async () => generation,
    async writeGeneration(next) {
      generation = next
    },
    async holdBallast() {
      hasBallast = true
    },
    async dropBallast() {
      const had = hasBallast
      hasBallast = false
      return had
    },
  }
}
