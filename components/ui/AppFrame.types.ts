import type { ReactNode } from 'react'
import type { IconName } from './iconLines'

/** A place in the app that the navigation leads to. */
export interface NavEntry {
  readonly href: string
  readonly label: string
  readonly icon: IconName
  /** How many things wait there; nothing is shown at 0. */
  readonly badge?: number
  /** Head over the entries of one side, such as "desk"; shown where there are several. */
  readonly group?: string
}

export interface AppFrameProps {
  readonly entries: readonly NavEntry[]
  /** Path in force; the entry whose address it is or lies under is the current one. */
  readonly currentPath: string
  readonly onNavigate: (href: string) => void
  /** Beside the product's name in the side column: "Saltmarsh Hythe · desk". */
  readonly place?: string
  /** At the foot of the side column: who is signed in, the state of the network. */
  readonly foot?: ReactNode
  /** The foot also lies behind "More" on a phone, for sides without a screen of their own for it. */
  readonly hasFootOnPhone?: boolean
  /** Across the top of every screen: "Invented demo …". */
  readonly strip?: ReactNode
  readonly children: ReactNode
}
