export interface PreparedPhoto {
  readonly bytes: Uint8Array
  readonly sha256: string
  readonly widthPx: number
  readonly heightPx: number
  readonly mime: 'image/jpeg'
}
