import { setImmediate } from 'node:timers/promises'
import type { Position } from '@/shared/compute/spatial/spatial.types'
import type { OutlineFault } from '@/shared/schemas/outline'
import { judgeGeometry } from './judgeGeometry'
import type { JudgedFeatures, RawFeature, UsableFeature } from './outlines.types'
import { readAttributes } from './readAttributes'
import { typicalPosition } from './typicalPosition'

const BATCH = 250

/**
 * Checks, mends and measures every feature. The same outline twice counts once.
 *
 * @param known a position of the organisation's other outlines, to recognise a file whose coordinates are all swapped
 */
export async function judgeFeatures(features: readonly RawFeature[], known?: Position): Promise<JudgedFeatures> {
  const near = typicalPosition(features, known)
  const usable: UsableFeature[] = []
  const faults: Omit<OutlineFault, 'reference'>[] = []
  const seen = new Set<string>()
  for (const [index, { geometry, properties }] of features.entries()) {
    // Other requests get their turn: a file of 50,000 features takes seconds.
    if (index % BATCH === BATCH - 1) await setImmediate()
    const judged = judgeGeometry(geometry, near)
    if ('fault' in judged) {
      faults.push({ index, code: judged.fault, isMended: false })
      continue
    }
    if (seen.has(judged.key)) {
      faults.push({ index, code: 'duplicate', isMended: false })
      continue
    }
    seen.add(judged.key)
    if (judged.isClosedNow) faults.push({ index, code: 'not-closed', isMended: true })
    usable.push({
      index,
      geometry: judged.geometry,
      footprintM2: judged.footprintM2,
      innerPoint: judged.innerPoint,
      attributes: readAttributes(properties),
    })
  }
  return { usable, faults }
}
