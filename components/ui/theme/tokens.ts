/** Every colour a component may use, named by what it is for. Values are `#RRGGBB`. */
export interface Colours {
  /** The sheet everything lies on. */
  readonly ground: string
  /** A panel on the ground. */
  readonly panel: string
  /** Where something is typed or chosen. */
  readonly field: string
  /** Land on the map, troughs, heads of tables. */
  readonly sunken: string
  readonly ink: string
  readonly inkSoft: string
  /** Hairlines between things; never the only sign of anything. */
  readonly hairline: string
  /** The heavy rule at the head of a panel and the frame of a field. */
  readonly rule: string
  readonly action: string
  readonly onAction: string
  readonly selection: string
  readonly onSelection: string
  readonly good: string
  readonly onGood: string
  readonly attention: string
  readonly onAttention: string
  readonly error: string
  readonly onError: string
  /** Fill of the chosen one among several. */
  readonly chosen: string
  readonly onChosen: string
  /** Covers the page behind a dialog; the only colour with transparency. */
  readonly veil: string
}

/** What a panel, a badge or a notice is about. */
export type Tone = 'ink' | 'action' | 'selection' | 'good' | 'attention' | 'error'

/** A whole look: day or night, plain or for full sun. */
export interface Theme {
  readonly name: ThemeName
  readonly isNight: boolean
  readonly isBrightSun: boolean
  readonly colours: Colours
}

export type ThemeName = 'limewash' | 'limewash-sun' | 'night' | 'night-sun'

const limewash: Colours = {
  ground: '#F7F3EA',
  panel: '#FDFBF6',
  field: '#FFFFFF',
  sunken: '#EFE8DA',
  ink: '#20292E',
  inkSoft: '#4A5459',
  hairline: '#D3CBB9',
  rule: '#20292E',
  action: '#96381F',
  onAction: '#FDFBF6',
  selection: '#1B5566',
  onSelection: '#FDFBF6',
  good: '#4F6128',
  onGood: '#FDFBF6',
  attention: '#8A5A0B',
  onAttention: '#FDFBF6',
  error: '#A3153B',
  onError: '#FDFBF6',
  chosen: '#20292E',
  onChosen: '#FDFBF6',
  veil: 'rgba(32, 41, 46, 0.55)',
}

const limewashSun: Colours = {
  ...limewash,
  ground: '#FFFFFF',
  panel: '#FFFFFF',
  sunken: '#F4EEE0',
  ink: '#0B1013',
  inkSoft: '#2A3338',
  hairline: '#8D8470',
  rule: '#0B1013',
  action: '#7A2A14',
  onAction: '#FFFFFF',
  selection: '#0F4252',
  onSelection: '#FFFFFF',
  good: '#3A4A18',
  onGood: '#FFFFFF',
  attention: '#5E3C00',
  onAttention: '#FFFFFF',
  error: '#8A0D2F',
  onError: '#FFFFFF',
  chosen: '#0B1013',
  onChosen: '#FFFFFF',
}

const night: Colours = {
  ground: '#20292E',
  panel: '#2A353B',
  field: '#182024',
  sunken: '#182024',
  ink: '#F3EEE2',
  inkSoft: '#BFC4C2',
  hairline: '#4C595F',
  rule: '#F3EEE2',
  action: '#F0A389',
  onAction: '#20292E',
  selection: '#8FCBDD',
  onSelection: '#20292E',
  good: '#B9CC8B',
  onGood: '#20292E',
  attention: '#E6B65C',
  onAttention: '#20292E',
  error: '#F59AB0',
  onError: '#20292E',
  chosen: '#F3EEE2',
  onChosen: '#20292E',
  veil: 'rgba(8, 11, 13, 0.7)',
}

const nightSun: Colours = {
  ...night,
  ground: '#0A0E10',
  panel: '#12191D',
  field: '#0A0E10',
  sunken: '#1B2429',
  ink: '#FFFFFF',
  inkSoft: '#D9DDDA',
  hairline: '#7D888C',
  rule: '#FFFFFF',
  action: '#FFBEA8',
  onAction: '#0A0E10',
  selection: '#A8E0F0',
  onSelection: '#0A0E10',
  good: '#D2E5A4',
  onGood: '#0A0E10',
  attention: '#FFD27A',
  onAttention: '#0A0E10',
  error: '#FFB8C9',
  onError: '#0A0E10',
  chosen: '#FFFFFF',
  onChosen: '#0A0E10',
}

/** The four looks. Day and night reach WCAG 2.2 AA in every text pair, their bright-sun settings AAA. */
export const THEMES: Readonly<Record<ThemeName, Theme>> = {
  limewash: { name: 'limewash', isNight: false, isBrightSun: false, colours: limewash },
  'limewash-sun': { name: 'limewash-sun', isNight: false, isBrightSun: true, colours: limewashSun },
  night: { name: 'night', isNight: true, isBrightSun: false, colours: night },
  'night-sun': { name: 'night-sun', isNight: true, isBrightSun: true, colours: nightSun },
}

type ColourName = keyof Colours

const grounds: readonly ColourName[] = ['ground', 'panel', 'field', 'sunken']
const writtenOnGrounds: readonly ColourName[] = ['ink', 'inkSoft', 'action', 'selection', 'good', 'attention', 'error']

/** Every pair of text colour and ground that components may set; tests hold each to its contrast. */
export const TEXT_PAIRS: readonly (readonly [text: ColourName, ground: ColourName])[] = [
  ...grounds.flatMap((ground) => writtenOnGrounds.map((text) => [text, ground] as const)),
  ['onAction', 'action'],
  ['onSelection', 'selection'],
  ['onGood', 'good'],
  ['onAttention', 'attention'],
  ['onError', 'error'],
  ['onChosen', 'chosen'],
]

/** Colour of a tone as text, rule or outline. */
export function toneColour(tone: Tone, colours: Colours): string {
  return tone === 'ink' ? colours.ink : colours[tone]
}

/** Sizes of type [px]; there are no others. */
export const TYPE = { small: 13, body: 15, lead: 17, heading: 21, figure: 28 } as const

/** Line heights [px] that belong to the sizes of type. */
export const LINE = { small: 18, body: 22, lead: 24, heading: 28, figure: 34 } as const

export type TypeSize = keyof typeof TYPE

/** Gaps and paddings [px]. */
export const SPACE = { hair: 2, tight: 4, small: 8, medium: 12, large: 16, wide: 24, huge: 32 } as const

/** Corners are square but for this [px]. */
export const RADIUS = 2

/** Least size of anything to be touched [px]. */
export const TARGET = 48

/** Weight of the rule at the head of a panel [px]. */
export const HEAD_RULE = 4

/** How long anything moves [ms]; nothing moves when the system asks for stillness. */
export const MOTION_MS = 140

/** From this width [px] on, a screen is laid out for a desk. */
export const WIDE_FROM_PX = 900
