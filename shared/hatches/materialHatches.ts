import type { Material } from '@/shared/compute/factors/vocabulary'
import type { Hatch } from './hatch.types'
import { diagonals, disc, tile } from './hatchLines'

const HONEYCOMB = 'M0 3.5L6 0L12 3.5V10.5L6 14L0 10.5zM6 14V21M0 3.5V0M12 3.5V0M0 21V17.5'

/**
 * How each material is drawn, after the hatches of technical drawing. Read in black and white they differ by their
 * lines alone.
 */
export const MATERIAL_HATCHES: Readonly<Record<Material, Hatch>> = {
  concrete: {
    ground: '#CBC8C0',
    ink: '#2F373B',
    full: tile(26, 26, {
      strokes: ['M4 8l5 -3.5 1 5.5z', 'M17 20l5 -1.5 -2 4.5z'],
      strokePx: 1,
      fills: [
        disc(15, 4, 0.9),
        disc(21, 10, 1.1),
        disc(11, 15, 0.9),
        disc(4, 19, 1.1),
        disc(13, 23, 0.8),
        disc(24, 16, 0.8),
      ],
    }),
    calm: tile(16, 16, {
      strokes: ['M3 6.5l4.5 -3 0.8 4.5z'],
      strokePx: 0.9,
      fills: [disc(12, 4, 0.9), disc(12.5, 12, 0.9), disc(5, 12.5, 0.9)],
    }),
  },
  'masonry-units': {
    ground: '#E0A18C',
    ink: '#7A2C17',
    full: diagonals(13, [
      { at: 2, widthPx: 1.1 },
      { at: 6, widthPx: 1.1 },
    ]),
    calm: diagonals(14, [
      { at: 2, widthPx: 1 },
      { at: 6, widthPx: 1 },
    ]),
  },
  'mortar-plaster': {
    ground: '#E6DFCF',
    ink: '#5A5342',
    full: tile(14, 10, { strokes: ['M1 2.5h5M8 7.5h5'], strokePx: 1.1 }),
    calm: tile(12, 12, { strokes: ['M1 3h5M7 9h5'], strokePx: 1 }),
  },
  'natural-stone': {
    ground: '#D6D0D6',
    ink: '#4B4152',
    full: tile(30, 24, {
      strokes: ['M0 7L9 10L13 0M9 10L7 24M9 10L20 13L24 4L30 7M24 4L21 0M20 13L22 24M13 0M7 24L13 24'],
      strokePx: 1.1,
    }),
    calm: tile(18, 16, { strokes: ['M0 5L6 7L9 0M6 7L4 16M6 7L13 9L18 5M13 9L14 16M14 0L14 0'], strokePx: 1 }),
  },
  ceramics: {
    ground: '#EBC9A6',
    ink: '#8A4312',
    full: tile(14, 14, { strokes: ['M0 0a7 7 0 0 0 14 0M-7 7a7 7 0 0 0 14 0M7 7a7 7 0 0 0 14 0'], strokePx: 1.1 }),
    calm: tile(16, 16, { strokes: ['M0 0a8 8 0 0 0 16 0M-8 8a8 8 0 0 0 16 0M8 8a8 8 0 0 0 16 0'], strokePx: 1 }),
  },
  steel: {
    ground: '#A3BBC6',
    ink: '#234452',
    full: diagonals(4.5, [{ at: 1, widthPx: 1 }]),
    calm: diagonals(5.5, [{ at: 1, widthPx: 0.9 }]),
  },
  aluminium: {
    ground: '#CFDCE2',
    ink: '#35535F',
    full: tile(12, 12, { strokes: ['M-1 -1L13 13', 'M5 -1L9 3M11 5L13 7M-1 5L2 8M5 11L7 13'], strokePx: 1 }),
    calm: tile(12, 12, { strokes: ['M-1 -1L13 13', 'M6 0L9 3M0 6L3 9'], strokePx: 0.9 }),
  },
  copper: {
    ground: '#DFB58F',
    ink: '#6B3A14',
    full: diagonals(9, [
      { at: 0, widthPx: 1 },
      { at: 0, widthPx: 1, rising: false },
    ]),
    calm: diagonals(10, [
      { at: 0, widthPx: 0.9 },
      { at: 0, widthPx: 0.9, rising: false },
    ]),
  },
  'other-metals': {
    ground: '#BFC3C9',
    ink: '#3A4048',
    full: tile(5, 10, { strokes: ['M2.5 -1V11'], strokePx: 1 }),
    calm: tile(5, 10, { strokes: ['M2.5 -1V11'], strokePx: 0.9 }),
  },
  timber: {
    ground: '#E5C283',
    ink: '#70490E',
    full: tile(32, 15, {
      strokes: [
        'M-1 2.5C6 0 10 5 17 2.5S27 0 33 2.5',
        'M-1 7.5C6 5.5 11 10 18 7.5S28 6 33 7.5',
        'M-1 12.5C7 10.5 10 15 16 12.5S27 10.5 33 12.5',
      ],
      strokePx: 1.1,
    }),
    calm: tile(24, 12, {
      strokes: ['M-1 3C4 1 8 5 13 3S21 1 25 3', 'M-1 9C4 7 8 11 13 9S21 7 25 9'],
      strokePx: 1,
    }),
  },
  glass: {
    ground: '#D8EAEC',
    ink: '#1F5A66',
    full: tile(26, 22, { strokes: ['M4 11L9 4M8 13L15 3.5M14 12L18 6'], strokePx: 1.1 }),
    calm: tile(18, 18, { strokes: ['M3 11L8 4M8 13L13 6'], strokePx: 1 }),
  },
  gypsum: {
    ground: '#F3EEDF',
    ink: '#4B5054',
    full: tile(10, 10, { fills: [disc(2.5, 2.5, 1.1), disc(7.5, 7.5, 1.1)] }),
    calm: tile(10, 10, { fills: [disc(2.5, 2.5, 1), disc(7.5, 7.5, 1)] }),
  },
  'mineral-insulation': {
    ground: '#F4DDE4',
    ink: '#93274B',
    full: tile(12, 24, {
      strokes: ['M0 22C0 12 9 12 9 4C9 0 3 0 3 4C3 12 12 12 12 22'],
      strokePx: 1.1,
    }),
    calm: tile(14, 20, { strokes: ['M0 19C0 10 10 10 10 4C10 0.5 4 0.5 4 4C4 10 14 10 14 19'], strokePx: 1 }),
  },
  'plastic-insulation': {
    ground: '#E8DDF0',
    ink: '#5B3A78',
    full: tile(12, 21, { strokes: [HONEYCOMB], strokePx: 1 }),
    calm: tile(12, 21, { strokes: [HONEYCOMB], strokePx: 0.8 }),
  },
  plastics: {
    ground: '#D9D3EE',
    ink: '#42367D',
    full: diagonals(12, [
      { at: 2, widthPx: 3, rising: false },
      { at: 7.5, widthPx: 0.9, rising: false },
    ]),
    calm: diagonals(12, [
      { at: 2, widthPx: 2.4, rising: false },
      { at: 7.5, widthPx: 0.8, rising: false },
    ]),
  },
  bitumen: {
    ground: '#363B40',
    ink: '#E9E4D6',
    full: tile(10, 9, { strokes: ['M-1 4.5H11'], strokePx: 1 }),
    calm: tile(10, 8, { strokes: ['M-1 4H11'], strokePx: 1 }),
  },
  'asbestos-cement': {
    ground: '#F2C9CF',
    ink: '#8E0F31',
    full: tile(16, 16, { strokes: ['M2 2L7 7M7 2L2 7M10 10L15 15M15 10L10 15'], strokePx: 1.3 }),
    calm: tile(14, 14, { strokes: ['M1.5 1.5L6 6M6 1.5L1.5 6M8.5 8.5L13 13M13 8.5L8.5 13'], strokePx: 1.1 }),
  },
  other: {
    ground: '#EDE9DE',
    ink: '#5F6468',
    full: tile(20, 20, { strokes: [disc(5, 5, 2.4), disc(15, 15, 2.4)], strokePx: 1 }),
    calm: tile(16, 16, { strokes: [disc(4, 4, 2.2), disc(12, 12, 2.2)], strokePx: 0.9 }),
  },
}
