import type { Hatch } from '@/shared/hatches/hatch.types'

/** Pixels of the picture for one of the tile, so that it stays sharp on a phone. */
export const HATCH_IMAGE_RATIO = 2

/** The tile of a hatch as a picture that a map can repeat; null where the browser cannot draw. */
export function hatchImage(hatch: Hatch): ImageData | null {
  const { widthPx, heightPx, strokes, fills } = hatch.calm
  const canvas = document.createElement('canvas')
  canvas.width = Math.round(widthPx * HATCH_IMAGE_RATIO)
  canvas.height = Math.round(heightPx * HATCH_IMAGE_RATIO)
  const pen = canvas.getContext('2d')
  if (!pen) return null
  pen.scale(canvas.width / widthPx, canvas.height / heightPx)
  pen.fillStyle = hatch.ground
  pen.fillRect(0, 0, widthPx, heightPx)
  pen.strokeStyle = hatch.ink
  for (const stroke of strokes) {
    pen.lineWidth = stroke.widthPx
    pen.stroke(new Path2D(stroke.d))
  }
  pen.fillStyle = hatch.ink
  for (const d of fills) pen.fill(new Path2D(d))
  return pen.getImageData(0, 0, canvas.width, canvas.height)
}
