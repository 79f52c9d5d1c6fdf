import { between, chance } from './draw'
import { drawBuilding } from './drawBuilding'
import type { Corner, Random, Town, TownBlock, TownBuilding } from './town.types'
import { DISTRICTS, type DistrictName } from './townNames'

/** How the plots of a district lie. Lengths in metres. */
interface Pattern {
  readonly originM: Corner
  readonly turnRad: number
  readonly columns: number
  readonly rows: number
  readonly blockWidthM: number
  readonly blockDepthM: number
  readonly streetWidthM: number
  readonly plotWidthM: readonly [number, number]
  readonly buildingDepthM: readonly [number, number]
  readonly gapM: readonly [number, number]
  readonly gapShare: number
  readonly frontGardenM: number
}

const PATTERNS: Readonly<Record<DistrictName, Pattern>> = {
  Ropewalk: {
    originM: [0, 0],
    turnRad: 0.12,
    columns: 10,
    rows: 7,
    blockWidthM: 58,
    blockDepthM: 34,
    streetWidthM: 9,
    plotWidthM: [6, 10.5],
    buildingDepthM: [9, 12.5],
    gapM: [1.5, 9],
    gapShare: 0.14,
    frontGardenM: 0,
  },
  'Kiln Quarter': {
    originM: [760, -40],
    turnRad: -0.2,
    columns: 10,
    rows: 8,
    blockWidthM: 92,
    blockDepthM: 58,
    streetWidthM: 13,
    plotWidthM: [10, 24],
    buildingDepthM: [11, 21],
    gapM: [3, 12],
    gapShare: 0.4,
    frontGardenM: 2,
  },
  'Upper Fold': {
    originM: [120, 460],
    turnRad: 0.34,
    columns: 12,
    rows: 8,
    blockWidthM: 78,
    blockDepthM: 46,
    streetWidthM: 10,
    plotWidthM: [8, 12],
    buildingDepthM: [8, 11],
    gapM: [3, 7],
    gapShare: 0.75,
    frontGardenM: 5,
  },
}

/**
 * Lays out the invented town from a fixed seed: blocks between streets, buildings along both long sides,
 * gently bent so that nothing is a perfect grid.
 *
 * @returns about 2,400 buildings in metres east and north of the town's corner stone
 */
export function layOutTown(random: Random): Town {
  const buildings: TownBuilding[] = []
  const blocks: TownBlock[] = []
  for (const { name, streets } of DISTRICTS) {
    const pattern = PATTERNS[name]
    let number = 0
    const houseNumbers = new Map<string, number>()
    for (let row = 0; row < pattern.rows; row++) {
      for (let column = 0; column < pattern.columns; column++) {
        if (chance(random, 0.04)) continue
        number += 1
        const left = column * (pattern.blockWidthM + pattern.streetWidthM)
        const foot = row * (pattern.blockDepthM + pattern.streetWidthM)
        const place = (corner: Corner): Corner => bend(turn([left + corner[0], foot + corner[1]], pattern))
        blocks.push({
          district: name,
          number,
          name: `Block ${number}`,
          corners: rectangle(-2, -2, pattern.blockWidthM + 2, pattern.blockDepthM + 2).map(place),
        })
        const southStreet = streets[row % streets.length]!
        const northStreet = streets[(row + 1) % streets.length]!
        for (const [street, isNorth] of [
          [southStreet, false],
          [northStreet, true],
        ] as const) {
          for (const corners of rowOfFootprints(random, pattern, isNorth)) {
            const next = (houseNumbers.get(street) ?? (isNorth ? 0 : -1)) + 2
            houseNumbers.set(street, next)
            buildings.push(
              drawBuilding(random, {
                district: name,
                blockNumber: number,
                street,
                houseNumber: String(next),
                corners: corners.map(place),
              }),
            )
          }
        }
      }
    }
  }
  return { buildings, blocks }
}

function rowOfFootprints(random: Random, pattern: Pattern, isNorth: boolean): Corner[][] {
  const footprints: Corner[][] = []
  let x = between(random, 0, 2)
  for (;;) {
    const width = between(random, ...pattern.plotWidthM)
    if (x + width > pattern.blockWidthM) return footprints
    const depth = Math.min(
      between(random, ...pattern.buildingDepthM),
      pattern.blockDepthM / 2 - pattern.frontGardenM - 2,
    )
    if (!chance(random, 0.05)) footprints.push(footprint(random, x, width, depth, pattern, isNorth))
    x += width + (chance(random, pattern.gapShare) ? between(random, ...pattern.gapM) : 0)
  }
}

/** A rectangle, or an L with a rear wing. */
function footprint(
  random: Random,
  x: number,
  width: number,
  depth: number,
  pattern: Pattern,
  isNorth: boolean,
): Corner[] {
  const setBack = pattern.frontGardenM
  const wing = chance(random, 0.3)
    ? { width: width * between(random, 0.35, 0.55), depth: between(random, 2.5, 4.5) }
    : null
  const fits = wing && setBack + depth + wing.depth < pattern.blockDepthM / 2 - 0.5
  const shape: Corner[] = fits
    ? [
        [x, setBack],
        [x + width, setBack],
        [x + width, setBack + depth],
        [x + wing.width, setBack + depth],
        [x + wing.width, setBack + depth + wing.depth],
        [x, setBack + depth + wing.depth],
      ]
    : rectangle(x, setBack, x + width, setBack + depth)
  return isNorth ? shape.map(([east, north]): Corner => [east, pattern.blockDepthM - north]).reverse() : shape
}

function rectangle(west: number, south: number, east: number, north: number): Corner[] {
  return [
    [west, south],
    [east, south],
    [east, north],
    [west, north],
  ]
}

function turn([east, north]: Corner, { originM, turnRad }: Pattern): Corner {
  const [cos, sin] = [Math.cos(turnRad), Math.sin(turnRad)]
  return [originM[0] + east * cos - north * sin, originM[1] + east * sin + north * cos]
}

/** A slow wave over the whole town: streets follow the old shore. */
function bend([east, north]: Corner): Corner {
  return [east + 9 * Math.sin(north / 140), north + 12 * Math.sin(east / 190 + 0.6)]
}
