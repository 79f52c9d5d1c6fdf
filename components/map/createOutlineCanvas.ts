import type { Feature, FeatureCollection, Position } from 'geojson'
import type { FilterSpecification, GeoJSONSource, Map as MapLibreMap, MapMouseEvent } from 'maplibre-gl'
import type { Colours } from '@/components/ui/theme/tokens'
import { MATERIALS } from '@/shared/compute/factors/vocabulary'
import { MATERIAL_HATCHES } from '@/shared/hatches/materialHatches'
import { accuracyRing } from './accuracyRing'
import { closedRing, type Bounds } from './boundsOf'
import { HATCH_IMAGE_RATIO, hatchImage } from './hatchImage'
import { mapStyle, type SourceName } from './mapStyle'
import type { MapPosition } from './OutlineMap.types'

/** Where the build puts the worker of the map library. */
const WORKER_ADDRESS = '/maplibre-gl-worker.mjs'

/** The map as the component drives it: it is told what to show, and tells where it was pressed. */
export interface OutlineCanvas {
  setFeatures(source: SourceName, features: FeatureCollection): void
  setSelected(ids: readonly string[]): void
  setPosition(position: MapPosition | null): void
  setDraft(corners: readonly Position[]): void
  fit(bounds: Bounds, moves: boolean): void
  zoomBy(steps: 1 | -1): void
  centreOn(position: MapPosition): void
  centre(): Position
  canvas(): HTMLCanvasElement
}

interface OutlineCanvasOptions {
  readonly container: HTMLElement
  readonly colours: Colours
  /** Where to begin, before anything moves. */
  readonly bounds: Bounds | null
  /** Outline under the press, if any, and the place. */
  readonly onPress: (id: string | null, place: Position) => void
  /** The map cannot go on: the device took its drawing context away. */
  readonly onFault: () => void
  /** Gives the map up, whether it has come up or not. */
  readonly signal: AbortSignal
}

/** A map that is not up by then has no worker and never will be [ms]. */
const START_WITHIN_MS = 20_000

/**
 * Starts the map in its container.
 *
 * @returns the running map, when its style is there and it takes features
 * @throws {Error} the browser has no WebGL, the worker did not come, or the map was given up
 */
export async function createOutlineCanvas(options: OutlineCanvasOptions): Promise<OutlineCanvas> {
  const maplibre = await import('maplibre-gl')
  maplibre.setWorkerUrl(WORKER_ADDRESS)
  const { container, colours, bounds, onPress, onFault, signal } = options
  signal.throwIfAborted()
  const map = new maplibre.Map({
    container,
    style: mapStyle(colours),
    attributionControl: false,
    maxZoom: 21,
    dragRotate: false,
    pitchWithRotate: false,
    touchPitch: false,
    fadeDuration: 0,
    ...(bounds ? { bounds: toCorners(bounds), fitBoundsOptions: { padding: FIT_PADDING_PX } } : {}),
  })
  map.touchZoomRotate.disableRotation()
  map.keyboard.disableRotation()
  map.on('webglcontextlost', onFault)
  signal.addEventListener('abort', () => map.remove(), { once: true })
  await isUp(map, signal)
  for (const material of MATERIALS) {
    const image = hatchImage(MATERIAL_HATCHES[material])
    if (image) map.addImage(material, image, { pixelRatio: HATCH_IMAGE_RATIO })
  }
  map.on('click', (event: MapMouseEvent) => onPress(outlineAt(map, event), event.lngLat.toArray()))
  map.on('mouseenter', 'outline-fill', () => (map.getCanvas().style.cursor = 'pointer'))
  map.on('mouseleave', 'outline-fill', () => (map.getCanvas().style.cursor = ''))
  return drive(map)
}

function isUp(map: MapLibreMap, signal: AbortSignal): Promise<void> {
  return new Promise((resolve, reject) => {
    const tooLate = setTimeout(() => reject(new Error('the map did not come up')), START_WITHIN_MS)
    signal.addEventListener('abort', () => reject(new Error('the map was given up')), { once: true })
    map.once('load', () => {
      clearTimeout(tooLate)
      resolve()
    })
  })
}

const FIT_PADDING_PX = 32
/** A finger is broader than a pointer: this far around a press an outline counts as hit [px]. */
const FINGER_PX = 8

function drive(map: MapLibreMap): OutlineCanvas {
  const fill = (source: SourceName, features: FeatureCollection): void => {
    map.getSource<GeoJSONSource>(source)?.setData(features)
  }
  const jump = { duration: 0 }
  return {
    setFeatures: fill,
    setSelected: (ids) => {
      const filter: FilterSpecification = ['in', ['get', 'id'], ['literal', [...ids]]]
      map.setFilter('outline-selected', filter)
    },
    setPosition: (position) => fill('position', positionFeatures(position)),
    setDraft: (corners) => fill('draft', draftFeatures(corners)),
    fit: (bounds, moves) =>
      void map.fitBounds(toCorners(bounds), {
        padding: FIT_PADDING_PX,
        maxZoom: 18.5,
        ...(moves ? { duration: 180 } : jump),
      }),
    zoomBy: (steps) => void map.zoomTo(map.getZoom() + steps, { duration: 140 }),
    centreOn: ({ longitude, latitude }) =>
      void map.easeTo({ center: [longitude, latitude], zoom: Math.max(map.getZoom(), 17), duration: 180 }),
    centre: () => map.getCenter().toArray(),
    canvas: () => map.getCanvas(),
  }
}

function outlineAt(map: MapLibreMap, { point }: MapMouseEvent): string | null {
  const exact = map.queryRenderedFeatures(point, { layers: ['outline-fill'] })
  const near =
    exact.length > 0
      ? exact
      : map.queryRenderedFeatures(
          [
            [point.x - FINGER_PX, point.y - FINGER_PX],
            [point.x + FINGER_PX, point.y + FINGER_PX],
          ],
          { layers: ['outline-fill'] },
        )
  const id: unknown = near[0]?.properties.id
  return typeof id === 'string' ? id : null
}

function positionFeatures(position: MapPosition | null): FeatureCollection {
  if (!position) return { type: 'FeatureCollection', features: [] }
  const dot: Feature = {
    type: 'Feature',
    properties: {},
    geometry: { type: 'Point', coordinates: [position.longitude, position.latitude] },
  }
  return {
    type: 'FeatureCollection',
    features: [{ type: 'Feature', properties: {}, geometry: accuracyRing(position) }, dot],
  }
}

function draftFeatures(corners: readonly Position[]): FeatureCollection {
  const dots = corners.map((coordinates): Feature => ({
    type: 'Feature',
    properties: {},
    geometry: { type: 'Point', coordinates: [...coordinates] },
  }))
  const drawn: Feature[] =
    corners.length > 2
      ? [{ type: 'Feature', properties: {}, geometry: { type: 'Polygon', coordinates: [closedRing(corners)] } }]
      : corners.length === 2
        ? [{ type: 'Feature', properties: {}, geometry: { type: 'LineString', coordinates: [...corners] } }]
        : []
  return { type: 'FeatureCollection', features: [...drawn, ...dots] }
}

function toCorners([west, south, east, north]: Bounds): [[number, number], [number, number]] {
  return [
    [west, south],
    [east, north],
  ]
}
