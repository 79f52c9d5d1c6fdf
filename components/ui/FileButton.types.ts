import type { ButtonKind } from './Button'
import type { IconName } from './iconLines'

export interface FileButtonProps {
  readonly label: string
  /** What may be chosen, as in HTML: `.geojson,.zip` or `image/*`. */
  readonly accept: string
  readonly onFiles: (files: readonly File[]) => void
  readonly multiple?: boolean
  /** Opens the camera at once where there is one. */
  readonly camera?: boolean
  readonly kind?: ButtonKind
  readonly icon?: IconName
  readonly busy?: boolean
  readonly disabled?: boolean
  readonly grow?: boolean
}
