import { z } from 'zod'
import { ComputeError, type ComputeErrorCode } from '@/shared/compute/errors'
import { interiorPoint } from '@/shared/compute/spatial/interiorPoint'
import { normaliseOutline } from '@/shared/compute/spatial/normaliseOutline'
import { outlineArea } from '@/shared/compute/spatial/outlineArea'
import type { Outline, Position, Ring } from '@/shared/compute/spatial/spatial.types'
import type { OutlineFault } from '@/shared/schemas/outline'
import type { AreaGeometry } from '@/shared/schemas/primitives'

/** More corners than a building has; finding crossings among more of them takes minutes. */
const POSITION_LIMIT = 10_000
const LEAST_AREA_M2 = 0.1
/** Below this distance from the rest of the file nobody asks whether an outline is swapped. */
const NEAR_DEG = 0.5

const rings = z.array(z.array(z.array(z.number()).min(2)))
const polygonal = z.union([
  z.object({ type: z.literal('Polygon'), coordinates: rings }).transform(({ coordinates }) => [coordinates]),
  z
    .object({ type: z.literal('MultiPolygon'), coordinates: z.array(rings) })
    .transform(({ coordinates }) => coordinates),
])

const faultOf: Partial<Record<ComputeErrorCode, OutlineFault['code']>> = {
  'ring-too-short': 'too-few-positions',
  'ring-crosses-itself': 'self-crossing',
  'ring-invalid': 'no-area',
  'coordinates-swapped': 'coordinates-swapped',
  'coordinates-projected': 'coordinates-projected',
  'coordinates-out-of-range': 'coordinates-out-of-range',
  'not-a-number': 'coordinates-out-of-range',
}

/** A geometry that can be taken, or the one fault that speaks against it. */
export type JudgedGeometry =
  | {
      readonly geometry: AreaGeometry
      readonly footprintM2: number
      readonly innerPoint: readonly [number, number]
      readonly isClosedNow: boolean
      /** The same for every way of writing the same rings. */
      readonly key: string
    }
  | { readonly fault: OutlineFault['code'] }

/** Checks one geometry of a file; open rings are closed, turned rings put right, everything else is a fault. */
export function judgeGeometry(geometry: unknown, near: Position | undefined): JudgedGeometry {
  if (geometry === null || geometry === undefined) return { fault: 'no-geometry' }
  const parsed = polygonal.safeParse(geometry)
  if (!parsed.success) return { fault: faultOfShape(geometry) }
  const polygons = parsed.data
  if (polygons.length === 0 || polygons.every((polygon) => polygon.length === 0)) return { fault: 'no-geometry' }
  if (polygons.flat(2).length > POSITION_LIMIT) return { fault: 'not-a-polygon' }
  try {
    return measure(polygons, near)
  } catch (error) {
    const fault = error instanceof ComputeError ? faultOf[error.code] : undefined
    if (fault === undefined) throw error
    return { fault }
  }
}

function faultOfShape(geometry: unknown): OutlineFault['code'] {
  const { type } = geometry as { type?: unknown }
  const isPolygonal = type === 'Polygon' || type === 'MultiPolygon'
  return isPolygonal ? 'coordinates-out-of-range' : 'not-a-polygon'
}

function measure(polygons: readonly number[][][][], near: Position | undefined): JudgedGeometry {
  const parts = polygons.map((polygon) => normaliseOutline(polygon, isFar(polygon, near) ? near : undefined))
  const outlines = parts.map(({ outline }) => outline)
  const areas = outlines.map(outlineArea)
  const footprintM2 = areas.reduce((sum, area) => sum + area, 0)
  const largest = outlines[areas.indexOf(Math.max(...areas))]
  if (largest === undefined || !(footprintM2 >= LEAST_AREA_M2)) return { fault: 'no-area' }
  const [longitude, latitude] = interiorPoint(largest)
  return {
    geometry: asGeometry(outlines),
    footprintM2,
    innerPoint: [longitude, latitude],
    isClosedNow: parts.some(({ changes }) => changes.includes('closed')),
    key: outlines.map(keyOf).sort().join('|'),
  }
}

function isFar(polygon: readonly number[][][], near: Position | undefined): boolean {
  const [x = 0, y = 0] = polygon[0]?.[0] ?? []
  return near !== undefined && (Math.abs(x - near[0]) > NEAR_DEG || Math.abs(y - near[1]) > NEAR_DEG)
}

function asGeometry(outlines: readonly Outline[]): AreaGeometry {
  const coordinates = outlines.map(({ exterior, holes }) => [exterior, ...holes].map(pairs))
  const [only] = coordinates
  return coordinates.length === 1 && only
    ? { type: 'Polygon', coordinates: only }
    : { type: 'MultiPolygon', coordinates }
}

function pairs(ring: Ring): [number, number][] {
  return ring.map(([longitude, latitude]) => [longitude, latitude])
}

function keyOf({ exterior, holes }: Outline): string {
  return [exterior, ...holes].map(keyOfRing).join('/')
}

/** The corners in their order, begun at the smallest. */
function keyOfRing(ring: Ring): string {
  const corners = ring.slice(1).map(([longitude, latitude]) => `${longitude},${latitude}`)
  const smallest = corners.reduce((best, corner, index) => (corner < (corners[best] ?? '') ? index : best), 0)
  return [...corners.slice(smallest), ...corners.slice(0, smallest)].join(' ')
}
