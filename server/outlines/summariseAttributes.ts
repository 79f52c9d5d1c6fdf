import type { StagedImport } from '@/shared/api/outlines'
import type { Attributes } from './outlines.types'

const SAMPLES = 5
const SAMPLE_LENGTH = 80

/** Each attribute of a file with how many features fill it and a few of its values, in the order of first sight. */
export function summariseAttributes(rows: readonly Attributes[]): StagedImport['attributes'] {
  const found = new Map<string, { filledCount: number; samples: Set<string> }>()
  for (const row of rows) {
    for (const [name, value] of Object.entries(row)) {
      const seen = found.get(name) ?? { filledCount: 0, samples: new Set<string>() }
      seen.filledCount += 1
      if (seen.samples.size < SAMPLES) seen.samples.add(String(value).slice(0, SAMPLE_LENGTH))
      found.set(name, seen)
    }
  }
  return [...found].map(([name, { filledCount, samples }]) => ({ name, filledCount, samples: [...samples] }))
}
