import type { LayerSpecification, StyleSpecification } from 'maplibre-gl'
import type { Colours } from '@/components/ui/theme/tokens'

/** Sources of the map; each is filled with `setData`. */
export const SOURCES = ['streets', 'outlines', 'areas', 'position', 'draft'] as const
export type SourceName = (typeof SOURCES)[number]

/** Below this zoom the lines of a hatch would run together, and the plain ground is drawn. */
const HATCH_FROM_ZOOM = 16.5
const LABEL_FONT = ['Barlow_600SemiBold', 'sans-serif']

/** The whole style: our own sources only, no tiles, no glyphs, no sprites. Labels are drawn from fonts of the page. */
export function mapStyle(colours: Colours): StyleSpecification {
  const empty = { type: 'FeatureCollection' as const, features: [] }
  return {
    version: 8,
    sources: Object.fromEntries(
      SOURCES.map((name) => [name, { type: 'geojson' as const, data: empty, tolerance: 0.2 }]),
    ),
    layers: [
      { id: 'ground', type: 'background', paint: { 'background-color': colours.sunken } },
      ...streetLayers(colours),
      ...outlineLayers(colours),
      ...streetNameLayers(colours),
      ...areaLayers(colours),
      ...positionLayers(colours),
      ...draftLayers(colours),
    ],
  }
}

function streetLayers(colours: Colours): LayerSpecification[] {
  return [
    {
      id: 'street',
      type: 'line',
      source: 'streets',
      layout: { 'line-cap': 'round', 'line-join': 'round' },
      paint: {
        'line-color': colours.panel,
        'line-width': ['interpolate', ['exponential', 2], ['zoom'], 13, 1.5, 17, 9, 20, 60],
      },
    },
  ]
}

function streetNameLayers(colours: Colours): LayerSpecification[] {
  return [
    {
      id: 'street-name',
      type: 'symbol',
      source: 'streets',
      minzoom: 15,
      layout: {
        'symbol-placement': 'line',
        'text-field': ['get', 'name'],
        'text-font': LABEL_FONT,
        'text-size': 12,
        'symbol-spacing': 300,
      },
      paint: { 'text-color': colours.inkSoft, 'text-halo-color': colours.panel, 'text-halo-width': 1.5 },
    },
  ]
}

function outlineLayers(colours: Colours): LayerSpecification[] {
  return [
    {
      id: 'outline-fill',
      type: 'fill',
      source: 'outlines',
      paint: { 'fill-color': ['get', 'fill'], 'fill-opacity': ['get', 'opacity'], 'fill-antialias': false },
    },
    {
      id: 'outline-hatch',
      type: 'fill',
      source: 'outlines',
      minzoom: HATCH_FROM_ZOOM,
      filter: ['has', 'hatch'],
      paint: { 'fill-pattern': ['get', 'hatch'], 'fill-opacity': ['get', 'opacity'] },
    },
    {
      id: 'outline-edge',
      type: 'line',
      source: 'outlines',
      paint: {
        'line-color': ['get', 'outline'],
        'line-width': [
          'interpolate',
          ['linear'],
          ['zoom'],
          13,
          ['*', 0.3, ['get', 'outlinePx']],
          17,
          ['get', 'outlinePx'],
        ],
        'line-opacity': ['get', 'opacity'],
      },
    },
    {
      id: 'outline-selected',
      type: 'line',
      source: 'outlines',
      filter: ['in', ['get', 'id'], ['literal', []]],
      layout: { 'line-join': 'miter' },
      paint: { 'line-color': colours.selection, 'line-width': 4 },
    },
  ]
}

function areaLayers(colours: Colours): LayerSpecification[] {
  return [
    {
      id: 'area-edge',
      type: 'line',
      source: 'areas',
      filter: ['!=', ['geometry-type'], 'Point'],
      layout: { 'line-join': 'miter' },
      paint: { 'line-color': ['get', 'colour'], 'line-width': 2.5, 'line-dasharray': [4, 2] },
    },
    {
      id: 'area-name',
      type: 'symbol',
      source: 'areas',
      filter: ['==', ['geometry-type'], 'Point'],
      layout: { 'text-field': ['get', 'name'], 'text-font': LABEL_FONT, 'text-size': 14 },
      paint: { 'text-color': colours.ink, 'text-halo-color': colours.panel, 'text-halo-width': 2 },
    },
  ]
}

function positionLayers(colours: Colours): LayerSpecification[] {
  return [
    {
      id: 'position-ring',
      type: 'fill',
      source: 'position',
      filter: ['==', ['geometry-type'], 'Polygon'],
      paint: { 'fill-color': colours.selection, 'fill-opacity': 0.16, 'fill-outline-color': colours.selection },
    },
    {
      id: 'position-dot',
      type: 'circle',
      source: 'position',
      filter: ['==', ['geometry-type'], 'Point'],
      paint: {
        'circle-radius': 7,
        'circle-color': colours.selection,
        'circle-stroke-color': colours.field,
        'circle-stroke-width': 3,
      },
    },
  ]
}

function draftLayers(colours: Colours): LayerSpecification[] {
  return [
    {
      id: 'draft-fill',
      type: 'fill',
      source: 'draft',
      filter: ['==', ['geometry-type'], 'Polygon'],
      paint: { 'fill-color': colours.action, 'fill-opacity': 0.14 },
    },
    {
      id: 'draft-edge',
      type: 'line',
      source: 'draft',
      filter: ['!=', ['geometry-type'], 'Point'],
      paint: { 'line-color': colours.action, 'line-width': 2.5 },
    },
    {
      id: 'draft-corner',
      type: 'circle',
      source: 'draft',
      filter: ['==', ['geometry-type'], 'Point'],
      paint: {
        'circle-radius': 6,
        'circle-color': colours.field,
        'circle-stroke-color': colours.action,
        'circle-stroke-width': 2.5,
      },
    },
  ]
}
