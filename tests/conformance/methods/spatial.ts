import { geodesicArea } from '@/shared/compute/spatial/geodesicArea'
import { geodesicDistance } from '@/shared/compute/spatial/geodesicDistance'
import { hexagonAreaM2 } from '@/shared/compute/spatial/hexagonAreaM2'
import { hexagonCell } from '@/shared/compute/spatial/hexagonCell'
import { hexagonCentre } from '@/shared/compute/spatial/hexagonCentre'
import { localPlaneArea } from '@/shared/compute/spatial/localPlaneArea'
import { normaliseRing } from '@/shared/compute/spatial/normaliseRing'
import { openRing } from '@/shared/compute/spatial/openRing'
import { outlineAreaError } from '@/shared/compute/spatial/outlineAreaError'
import { ringCrossing } from '@/shared/compute/spatial/ringCrossing'
import { ringOrientation } from '@/shared/compute/spatial/ringOrientation'
import { signedPlaneArea } from '@/shared/compute/spatial/signedPlaneArea'
import { planeCentroid } from '@/shared/compute/spatial/planeCentroid'
import type { PlanePoint, Position } from '@/shared/compute/spatial/spatial.types'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import { numberListsOf, numberOf, optionalNumberOf, type ConformanceInputs } from '@/tests/conformance/inputs'

const RADIANS = Math.PI / 180
const MEAN_RADIUS_M = 6_371_008.8
const MERCATOR_RADIUS_M = 6_378_137

function firstKey(inputs: ConformanceInputs, keys: readonly string[]): string {
  const found = keys.find((key) => inputs[key] !== undefined)
  if (found === undefined) throw new Error(`none of the inputs ${keys.join(', ')} is there`)
  return found
}

function pairsOf(inputs: ConformanceInputs, keys: readonly string[]): [number, number][] {
  return numberListsOf(inputs, firstKey(inputs, keys)).map(([first = Number.NaN, second = Number.NaN]) => [
    first,
    second,
  ])
}

/** Exterior and holes of `ring`, `polygon` or `coordinates`; the latter may be a list of rings. */
function ringsOf(inputs: ConformanceInputs): Position[][] {
  const key = firstKey(inputs, ['ring', 'polygon', 'coordinates', 'exterior', 'points'])
  const value = inputs[key]
  const isListOfRings = Array.isArray(value) && Array.isArray(value[0]) && Array.isArray(value[0][0])
  const rings: unknown[] = isListOfRings ? value : [value]
  const holes = Array.isArray(inputs.holes) ? inputs.holes : []
  return [...rings, ...holes].map((ring) => pairsOf({ ring }, ['ring']))
}

/** The two planar mistakes a map library invites; production code has neither. */
function mistakenAreas(ring: readonly Position[]) {
  const [, latitude] = planeCentroid(openRing(ring))
  const onSphere = ring.map(([longitude, north]): PlanePoint => [
    MEAN_RADIUS_M * longitude * RADIANS * Math.cos(latitude * RADIANS),
    MEAN_RADIUS_M * north * RADIANS,
  ])
  const onMercator = ring.map(([longitude, north]): PlanePoint => [
    MERCATOR_RADIUS_M * longitude * RADIANS,
    MERCATOR_RADIUS_M * Math.log(Math.tan(Math.PI / 4 + (north * RADIANS) / 2)),
  ])
  return { sphereM2: Math.abs(signedPlaneArea(onSphere)), mercatorM2: Math.abs(signedPlaneArea(onMercator)) }
}

function planarAreas(ring: readonly Position[], areaM2: number) {
  if (ring.some(([, latitude]) => Math.abs(latitude) > 85)) return {}
  const { sphereM2, mercatorM2 } = mistakenAreas(ring)
  return {
    local_planar_ellipsoidal_m2: Math.abs(localPlaneArea(ring)),
    local_planar_sphere_m2: sphereM2,
    web_mercator_planar_m2: mercatorM2,
    web_mercator_factor: mercatorM2 / areaM2,
  }
}

function geodesicAreaFigures(inputs: ConformanceInputs) {
  const [exterior = [], ...holes] = ringsOf(inputs)
  const outer = geodesicArea(exterior)
  const inner = holes.map((hole) => geodesicArea(hole))
  return {
    area_m2: inner.reduce((areaM2, hole) => areaM2 - hole.areaM2, outer.areaM2),
    perimeter_m: inner.reduce((perimeterM, hole) => perimeterM + hole.perimeterM, outer.perimeterM),
    orientation: outer.orientation,
    ...planarAreas(exterior, outer.areaM2),
  }
}

function geodesicDistanceFigures(inputs: ConformanceInputs) {
  const ends = ['from', 'to'].map((end) => {
    const [position = [0, 0] as const] = pairsOf({ ends: [inputs[firstKey(inputs, [`${end}_lonlat`, end])]] }, ['ends'])
    return position
  })
  const [from = [0, 0] as const, to = [0, 0] as const] = ends
  const way = geodesicDistance(from, to)
  const back = geodesicDistance(to, from)
  return {
    distance_m: way.distanceM,
    forward_azimuth_deg: way.forwardAzimuthDeg,
    final_azimuth_deg: way.finalAzimuthDeg,
    back_azimuth_deg: back.forwardAzimuthDeg,
  }
}

function outlineAreaErrorFigures(inputs: ConformanceInputs) {
  const corners = pairsOf(inputs, ['rectangle', 'polygon', 'outline', 'ring', 'points', 'vertices', 'corners'])
  const { areaM2, standardDeviationM2, relative } = outlineAreaError(
    corners,
    numberOf(inputs, firstKey(inputs, ['sigma', 'sigma_m'])),
  )
  return { area_m2: areaM2, sd_m2: standardDeviationM2, variance_m4: standardDeviationM2 ** 2, relative }
}

function hexBinFigures(inputs: ConformanceInputs) {
  const s = optionalNumberOf(inputs, 's') ?? numberOf(inputs, firstKey(inputs, ['circumradius', 'size']))
  const cells = pairsOf(inputs, ['points']).map((point) => hexagonCell(point, s))
  const counts: Record<string, number> = {}
  for (const { q, r } of cells) counts[`${q},${r}`] = (counts[`${q},${r}`] ?? 0) + 1
  return {
    cells: cells.map(({ q, r }) => [q, r]),
    cell_area: hexagonAreaM2(s),
    centres: cells.map((cell) => [...hexagonCentre(cell, s)]),
    centers: cells.map((cell) => [...hexagonCentre(cell, s)]),
    counts,
  }
}

function geojsonRingFigures(inputs: ConformanceInputs) {
  const [positions = []] = ringsOf(inputs)
  const role = roleOf(inputs)
  const closed = isClosed(positions)
  const orientation = ringOrientation(positions)
  const isCrossing = ringCrossing(positions) !== undefined
  const isValid = isAccepted(positions, role)
  return {
    valid_closure: closed && positions.length >= 4,
    closed,
    enough_positions: positions.length >= 4,
    orientation,
    needs_reversal: orientation === (role === 'exterior' ? 'clockwise' : 'counter-clockwise'),
    coordinate_order: '[longitude, latitude]',
    self_intersects: isCrossing,
    self_intersecting: isCrossing,
    crosses_antimeridian: crossesAntimeridian(positions),
    valid: closed && positions.length >= 4 && isValid,
    normalised: isValid ? normaliseRing(positions, { role }).ring : undefined,
  }
}

function roleOf(inputs: ConformanceInputs): 'exterior' | 'hole' {
  const names = [inputs.role, inputs.kind, inputs.type]
  const isHole = names.some((name) => name === 'hole' || name === 'interior' || name === 'inner')
  return isHole || inputs.hole === true || inputs.is_hole === true ? 'hole' : 'exterior'
}

function isClosed(positions: readonly Position[]): boolean {
  const first = positions[0]
  const last = positions.at(-1)
  return positions.length >= 2 && first?.[0] === last?.[0] && first?.[1] === last?.[1]
}

function crossesAntimeridian(positions: readonly Position[]): boolean {
  return positions.some(([longitude], index) => {
    const [before = longitude] = positions[index - 1] ?? []
    return Math.abs(longitude - before) > 180
  })
}

function isAccepted(positions: readonly Position[], role: 'exterior' | 'hole'): boolean {
  try {
    return normaliseRing(positions, { role }).ring.length >= 4
  } catch {
    return false
  }
}

/** Outlines, distances and cells. */
export const spatialMethods: Readonly<Record<string, ConformanceMethod>> = {
  'geodesic-area': geodesicAreaFigures,
  'geodesic-distance': geodesicDistanceFigures,
  'outline-area-error': outlineAreaErrorFigures,
  'hex-bin': hexBinFigures,
  'geojson-ring': geojsonRingFigures,
}
