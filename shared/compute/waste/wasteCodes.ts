/** One entry of chapter 17 of the European List of Waste. */
export interface WasteCodeEntry {
  /** Six digits in pairs; an asterisk marks hazardous waste. */
  readonly code: string
  /** The list's own words. */
  readonly text: string
}

/** Where the entries come from. */
export const WASTE_CODES_SOURCE = 'Commission Decision 2000/532/EC as amended (List of Waste), chapter 17'

/** Construction and demolition wastes, chapter 17 of the European List of Waste. */
export const WASTE_CODES = [
  { code: '17 01 01', text: 'concrete' },
  { code: '17 01 02', text: 'bricks' },
  { code: '17 01 03', text: 'tiles and ceramics' },
  {
    code: '17 01 06*',
    text: 'mixtures of, or separate fractions of concrete, bricks, tiles and ceramics containing hazardous substances',
  },
  { code: '17 01 07', text: 'mixtures of concrete, bricks, tiles and ceramics other than those mentioned in 17 01 06' },
  { code: '17 02 01', text: 'wood' },
  { code: '17 02 02', text: 'glass' },
  { code: '17 02 03', text: 'plastic' },
  { code: '17 02 04*', text: 'glass, plastic and wood containing or contaminated with hazardous substances' },
  { code: '17 03 01*', text: 'bituminous mixtures containing coal tar' },
  { code: '17 03 02', text: 'bituminous mixtures other than those mentioned in 17 03 01' },
  { code: '17 03 03*', text: 'coal tar and tarred products' },
  { code: '17 04 01', text: 'copper, bronze, brass' },
  { code: '17 04 02', text: 'aluminium' },
  { code: '17 04 03', text: 'lead' },
  { code: '17 04 04', text: 'zinc' },
  { code: '17 04 05', text: 'iron and steel' },
  { code: '17 04 06', text: 'tin' },
  { code: '17 04 07', text: 'mixed metals' },
  { code: '17 04 09*', text: 'metal waste contaminated with hazardous substances' },
  { code: '17 04 10*', text: 'cables containing oil, coal tar and other hazardous substances' },
  { code: '17 04 11', text: 'cables other than those mentioned in 17 04 10' },
  { code: '17 05 03*', text: 'soil and stones containing hazardous substances' },
  { code: '17 05 04', text: 'soil and stones other than those mentioned in 17 05 03' },
  { code: '17 05 05*', text: 'dredging spoil containing hazardous substances' },
  { code: '17 05 06', text: 'dredging spoil other than those mentioned in 17 05 05' },
  { code: '17 05 07*', text: 'track ballast containing hazardous substances' },
  { code: '17 05 08', text: 'track ballast other than those mentioned in 17 05 07' },
  { code: '17 06 01*', text: 'insulation materials containing asbestos' },
  { code: '17 06 03*', text: 'other insulation materials consisting of or containing hazardous substances' },
  { code: '17 06 04', text: 'insulation materials other than those mentioned in 17 06 01 and 17 06 03' },
  { code: '17 06 05*', text: 'construction materials containing asbestos' },
  { code: '17 08 01*', text: 'gypsum-based construction materials contaminated with hazardous substances' },
  { code: '17 08 02', text: 'gypsum-based construction materials other than those mentioned in 17 08 01' },
  { code: '17 09 01*', text: 'construction and demolition wastes containing mercury' },
  {
    code: '17 09 02*',
    text: 'construction and demolition wastes containing PCB (for example PCB-containing sealants, PCB-containing resin-based floorings, PCB-containing sealed glazing units, PCB-containing capacitors)',
  },
  {
    code: '17 09 03*',
    text: 'other construction and demolition wastes (including mixed wastes) containing hazardous substances',
  },
  {
    code: '17 09 04',
    text: 'mixed construction and demolition wastes other than those mentioned in 17 09 01, 17 09 02 and 17 09 03',
  },
] as const satisfies readonly WasteCodeEntry[]

export type WasteCode = (typeof WASTE_CODES)[number]['code']
