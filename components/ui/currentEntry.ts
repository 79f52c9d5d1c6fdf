import type { NavEntry } from './AppFrame.types'

/**
 * The entry a path belongs to: the one with the longest address that is the path or lies above it.
 *
 * @example currentEntry([{ href: '/rounds', label: 'Rounds', icon: 'rounds' }], '/rounds/7')?.label // => 'Rounds'
 */
export function currentEntry(entries: readonly NavEntry[], path: string): NavEntry | undefined {
  return entries
    .filter(({ href }) => path === href || path.startsWith(href.endsWith('/') ? href : `${href}/`))
    .sort((one, other) => other.href.length - one.href.length)[0]
}
