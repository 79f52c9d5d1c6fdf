import { grossFloorArea, type BuildingExtent } from '@/shared/compute/area/grossFloorArea'
import { DEFAULT_BASEMENT_HEIGHT_M, grossVolume } from '@/shared/compute/area/grossVolume'
import { convertArea } from '@/shared/compute/area/convertArea'
import { buildingStock, type StockBuilding, type StockFactor } from '@/shared/compute/factors/buildingStock'
import { AREA_BASES, COMPONENTS, type AreaBasis } from '@/shared/compute/factors/vocabulary'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import {
  isRecord,
  listOf,
  numberOf,
  optionalNumberOf,
  recordOf,
  textOf,
  type ConformanceInputs,
} from '@/tests/conformance/inputs'
import { spatialMethods } from './spatial'
import { wasteMethods } from './waste'

function grossFloorAreaFigures(inputs: ConformanceInputs) {
  const extent: BuildingExtent = {
    footprintM2: numberOf(inputs, 'footprint'),
    storeys: numberOf(inputs, 'storeys'),
    atticShare: optionalNumberOf(inputs, 'attic_share'),
    basementShare: optionalNumberOf(inputs, 'basement_share'),
  }
  const grossM2 = grossFloorArea(extent)
  return { gfa_m2: grossM2, ...netFigures(inputs, grossM2), ...volumeFigures(inputs, extent) }
}

function netFigures(inputs: ConformanceInputs, grossM2: number) {
  const netPerGross = optionalNumberOf(inputs, 'nfa_ratio')
  if (netPerGross === undefined) return {}
  const usablePerNet = optionalNumberOf(inputs, 'usable_ratio')
  const ratios = { netPerGross, usablePerNet: usablePerNet ?? 1, internalPerGross: 1, storeyHeightM: 1 }
  const conversion = { ...ratios, provenance: 'common-practice' } as const
  const gross = { amount: grossM2, basis: 'GFA' } as const
  return {
    nfa_m2: convertArea(gross, 'NFA', conversion).amount,
    ...(usablePerNet !== undefined && { usable_m2: convertArea(gross, 'usable', conversion).amount }),
  }
}

function volumeFigures(inputs: ConformanceInputs, extent: BuildingExtent) {
  const storeyHeightM = optionalNumberOf(inputs, 'storey_height')
  const basementHeightM = optionalNumberOf(inputs, 'basement_height') ?? DEFAULT_BASEMENT_HEIGHT_M
  return storeyHeightM === undefined ? {} : { gross_volume_m3: grossVolume(extent, storeyHeightM, basementHeightM) }
}

/** A basis the file names, or gross floor area, which `gfa` means. */
function basisOf(value: unknown): AreaBasis {
  return AREA_BASES.find((basis) => basis === value) ?? 'GFA'
}

/** A number, a component split that adds up, a trace, or nothing. */
function factorOf(value: unknown, areaBasis: AreaBasis, leftShare: (component: string) => number): StockFactor {
  if (typeof value === 'number') return { kind: 'known', kgPerM2: value * leftShare('structure'), areaBasis }
  if (value === 'trace') return { kind: 'trace' }
  if (!isRecord(value)) return { kind: 'missing' }
  const parts = Object.entries(value).map(([component, part]) =>
    typeof part === 'number' ? part * leftShare(component) : undefined,
  )
  if (parts.length === 0 || parts.includes(undefined)) return { kind: 'missing' }
  return { kind: 'known', kgPerM2: parts.reduce<number>((total, part) => total + (part ?? 0), 0), areaBasis }
}

/** Factors of one archetype by material, whether the file groups them by material or by component first. */
function factorsByMaterial(archetype: ConformanceInputs): ConformanceInputs {
  const components = Object.keys(archetype).filter((key) => COMPONENTS.some((component) => component === key))
  if (components.length === 0) return archetype
  const materials = new Set(components.flatMap((component) => Object.keys(recordOf(archetype, component))))
  return Object.fromEntries(
    [...materials].map((material) => {
      const parts = components
        .map((component) => [component, recordOf(archetype, component)[material]] as const)
        .filter(([, part]) => part !== undefined)
      return [material, Object.fromEntries(parts)]
    }),
  )
}

function stockBuilding(entry: unknown, inputs: ConformanceInputs, materials: readonly string[]): StockBuilding<string> {
  if (!isRecord(entry)) throw new Error('a building is not an object')
  const given = recordOf(inputs, 'factors')[textOf(entry, 'archetype')]
  const byMaterial = isRecord(given) ? factorsByMaterial(given) : {}
  const removed = isRecord(entry.removed_share) ? entry.removed_share : {}
  const leftShare = (component: string) => 1 - (optionalNumberOf(removed, component) ?? 0)
  const measured = [entry.overrides, entry.measured_kg, entry.override_kg].find(isRecord)
  const factorBasis = basisOf(inputs.factor_basis ?? inputs.area_basis)
  return {
    buildingId: String(entry.id),
    amount: optionalNumberOf(entry, 'gfa') ?? numberOf(entry, 'area'),
    areaBasis: basisOf(entry.area_basis ?? inputs.area_basis),
    factors: Object.fromEntries(
      materials.map((material) => [material, factorOf(byMaterial[material], factorBasis, leftShare)]),
    ),
    ...(measured !== undefined && {
      measuredKg: Object.fromEntries(Object.keys(measured).map((material) => [material, numberOf(measured, material)])),
    }),
  }
}

function buildingStockFigures(inputs: ConformanceInputs) {
  const materials = listOf(inputs, 'materials').map(String)
  const buildings = listOf(inputs, 'buildings').map((entry) => stockBuilding(entry, inputs, materials))
  const stock = buildingStock(buildings, materials)
  const byBuilding = (key: 'missingBuildingIds' | 'traceBuildingIds') =>
    buildings.flatMap(({ buildingId }) =>
      materials
        .filter((material) => stock[material]?.[key].includes(buildingId))
        .map((material) => [buildingId, material]),
    )
  const kg = Object.fromEntries(materials.map((material) => [material, stock[material]?.knownKg]))
  return {
    kg,
    total_kg: materials.reduce((total, material) => total + (stock[material]?.knownKg ?? 0), 0),
    missing: byBuilding('missingBuildingIds'),
    trace: byBuilding('traceBuildingIds'),
  }
}

/** Floor area and stock. */
export const areaMethods: Readonly<Record<string, ConformanceMethod>> = {
  'gross-floor-area': grossFloorAreaFigures,
  'building-stock': buildingStockFigures,
}

/** Inputs by which a mistake about areas, stocks, outlines or waste is recognised, and the method that is right. */
const OWN_SHAPES: readonly (readonly [readonly string[], ConformanceMethod | undefined])[] = [
  [['footprint', 'storeys'], areaMethods['gross-floor-area']],
  [['materials', 'factors', 'buildings'], areaMethods['building-stock']],
  [['mass_t', 'bulk_density'], wasteMethods.loads],
  [['streams'], wasteMethods['recovery-rate']],
  [['value', 'convert'], wasteMethods['unit-conversion']],
  [['points', 's'], spatialMethods['hex-bin']],
  [['rectangle', 'sigma'], spatialMethods['outline-area-error']],
  [['from_lonlat', 'to_lonlat'], spatialMethods['geodesic-distance']],
  [['ring'], spatialMethods['geodesic-area']],
]

/**
 * What production gives where a mistake about areas, stocks, outlines, units or waste is documented: its figures under
 * their own names, the first also as `correct`, and each under the name of the mistake, to be seen to differ.
 *
 * @returns undefined when the inputs are of another kind
 */
export function areaCounterExample(inputs: ConformanceInputs): unknown {
  const [, compute] = OWN_SHAPES.find(([keys]) => keys.every((key) => inputs[key] !== undefined)) ?? []
  const figures = compute?.(inputs)
  if (!isRecord(figures)) return undefined
  const renamed = Object.entries(figures).flatMap(([key, value]) =>
    ['correct', 'naive', 'wrong'].map((prefix) => [`${prefix}_${key}`, value]),
  )
  return { ...figures, ...Object.fromEntries(renamed), correct: figures, naive: figures, wrong: figures }
}
