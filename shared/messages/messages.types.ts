import type { en } from './en'

/** A text, or a nest of texts. An object with `one` and `other` is one text in its plural forms. */
export interface MessageTree {
  readonly [part: string]: string | MessageTree
}

type KeyOf<Tree, Prefix extends string = ''> = {
  [Part in keyof Tree & string]: Tree[Part] extends string
    ? `${Prefix}${Part}`
    : Tree[Part] extends { one: string; other: string }
      ? `${Prefix}${Part}`
      : KeyOf<Tree[Part], `${Prefix}${Part}.`>
}[keyof Tree & string]

/** Dotted address of a text, such as `common.cancel`. A text in plural forms has one address. */
export type MessageKey = KeyOf<typeof en>

/** What is put in the place of `{name}`. `count` chooses the plural form and is written with separators; any other number stands as it is, so format it first. */
export type MessageParts = Readonly<Record<string, string | number>>

/** Looks a text up and fills it in. */
export type Translate = (key: MessageKey, parts?: MessageParts) => string

/** The texts of one language. */
export interface Messages {
  readonly locale: string
  readonly t: Translate
}
