import { createElement, type ReactNode } from 'react'
import { Defs } from 'react-native-svg'

/** `Defs` of a drawing; its web types name no children. */
export function SvgDefs({ children }: { readonly children: ReactNode }) {
  return createElement(Defs, {}, children)
}
