import { Jimp } from 'jimp'
import type { TownBuilding } from './town.types'

export const FACADE_SIZE = { widthPx: 960, heightPx: 720 } as const

const SKY = 0xd9e2e4ff
const STREET = 0x8b8d86ff
const GLASS = 0x3c4c55ff
const DOOR = 0x5d3a27ff

const WALL: Readonly<Record<string, number>> = {
  'masonry-timber-floors': 0xa9583fff,
  'masonry-concrete-floors': 0xb98a66ff,
  'reinforced-concrete': 0xb4b2aaff,
  'precast-panel': 0xc3bfb3ff,
  'timber-frame': 0x9a7a4bff,
  'mass-timber': 0xb18f5aff,
  'steel-frame': 0x8fa0a8ff,
}

/** A street front as a child would draw it: wall, windows by storey, a door. JPEG bytes. */
export async function drawFacade({
  structure,
  storeys,
}: Pick<TownBuilding, 'structure' | 'storeys'>): Promise<Uint8Array> {
  const { widthPx, heightPx } = FACADE_SIZE
  const picture = new Jimp({ width: widthPx, height: heightPx, color: SKY })
  const fill = (x: number, y: number, width: number, height: number, color: number) =>
    picture.composite(
      new Jimp({ width: Math.round(width), height: Math.round(height), color }),
      Math.round(x),
      Math.round(y),
    )
  const floors = Math.max(1, Math.ceil(storeys))
  const ground = heightPx - 90
  const wallHeight = Math.min(ground - 40, floors * 120)
  const floorHeight = wallHeight / floors
  fill(0, ground, widthPx, 90, STREET)
  fill(160, ground - wallHeight, 640, wallHeight, WALL[structure] ?? 0xa08a70ff)
  for (let floor = 0; floor < floors; floor++) {
    for (let window = 0; window < 4; window++) {
      const isDoor = floor === 0 && window === 1
      const top = ground - (floor + 1) * floorHeight + floorHeight * 0.22
      fill(205 + window * 150, top, 90, isDoor ? floorHeight * 0.78 : floorHeight * 0.5, isDoor ? DOOR : GLASS)
    }
  }
  return new Uint8Array(await picture.getBuffer('image/jpeg', { quality: 78 }))
}
