const STYLE_ID = 'tallystone-map'

/** The few rules of the map library's style sheet that this map needs: its canvas, its cursor, its fingers. */
const RULES = `
.maplibregl-map { overflow: hidden; -webkit-tap-highlight-color: transparent; }
.maplibregl-map[style*="absolute"] { position: absolute; }
.maplibregl-canvas { position: absolute; left: 0; top: 0; }
.maplibregl-canvas:focus-visible { outline-offset: -3px !important; }
.maplibregl-canvas-container.maplibregl-interactive { cursor: grab; user-select: none; -webkit-user-select: none; }
.maplibregl-canvas-container.maplibregl-interactive:active { cursor: grabbing; }
.maplibregl-canvas-container.maplibregl-touch-zoom-rotate.maplibregl-touch-drag-pan,
.maplibregl-canvas-container.maplibregl-touch-zoom-rotate.maplibregl-touch-drag-pan .maplibregl-canvas { touch-action: none; }
.maplibregl-boxzoom { position: absolute; left: 0; top: 0; border: 2px dotted currentColor; }
`

/** Gives the page the style of the map, once. */
export function prepareMapDocument(): void {
  if (document.getElementById(STYLE_ID)) return
  const style = document.createElement('style')
  style.id = STYLE_ID
  style.textContent = RULES
  document.head.append(style)
}
