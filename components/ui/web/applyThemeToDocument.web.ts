import { HEAD_RULE, MOTION_MS, RADIUS, type Theme } from '@/components/ui/theme/tokens'

const STYLE_ID = 'tallystone-document'

/**
 * Gives the page itself the theme: its ground, the browser's own controls and bar, the outline of what has the
 * keyboard's focus, stillness where the system asks for it, and how it prints.
 */
export function applyThemeToDocument({ colours, isNight }: Theme): void {
  const root = document.documentElement
  root.style.backgroundColor = colours.ground
  root.style.colorScheme = isNight ? 'dark' : 'light'
  document.body.style.backgroundColor = colours.ground
  for (const meta of themeColourMetas()) meta.content = colours.ground
  styleElement().textContent = `
:focus-visible { outline: 3px solid ${colours.selection} !important; outline-offset: 2px; border-radius: ${RADIUS}px; }
[data-inset-focus]:focus-visible { outline-offset: -3px; }
::selection { background: ${colours.selection}; color: ${colours.onSelection}; }
[data-motion] { transition: background-color ${MOTION_MS}ms, border-color ${MOTION_MS}ms, color ${MOTION_MS}ms; }
[data-hover]:hover { background-color: ${colours.sunken}; }
[data-skip-link]:not(:focus) { clip-path: inset(50%); }
@media (prefers-reduced-motion: reduce) {
  *, *::before, *::after { transition: none !important; animation: none !important; scroll-behavior: auto !important; }
}
@media print {
  @page { margin: 14mm; }
  html, body, #root, [data-print-flow] {
    display: block !important; height: auto !important; max-height: none !important; overflow: visible !important;
    position: static !important; background: #fff !important;
  }
  [data-print-hide], nav { display: none !important; }
  [data-panel] { break-inside: avoid; border-top: ${HEAD_RULE}px solid #000 !important; }
}
`
}

function styleElement(): HTMLStyleElement {
  const known = document.getElementById(STYLE_ID)
  if (known instanceof HTMLStyleElement) return known
  const made = document.createElement('style')
  made.id = STYLE_ID
  document.head.append(made)
  return made
}

/** The metas of the page, which may hold one for day and one for night; one of our own where there is none. */
function themeColourMetas(): readonly HTMLMetaElement[] {
  const known = [...document.querySelectorAll<HTMLMetaElement>('meta[name="theme-color"]')]
  if (known.length > 0) return known
  const made = document.createElement('meta')
  made.name = 'theme-color'
  document.head.append(made)
  return [made]
}
