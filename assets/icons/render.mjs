import { readFileSync } from 'node:fs'
import path from 'node:path'
import { chromium } from '@playwright/test'

/** Draws the icons of the web app and the phone apps from the two SVG files. Run after a change: `node assets/icons/render.mjs`. */
const here = import.meta.dirname
const pictures = [
  ['mark.svg', 192, '../../public/icon-192.png'],
  ['mark.svg', 512, '../../public/icon-512.png'],
  ['mark.svg', 180, '../../public/apple-touch-icon.png'],
  ['mark-maskable.svg', 192, '../../public/icon-maskable-192.png'],
  ['mark-maskable.svg', 512, '../../public/icon-maskable-512.png'],
  ['mark.svg', 1024, 'icon.png'],
  ['mark-maskable.svg', 1024, 'icon-adaptive.png'],
]

const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox'] })
for (const [source, sizePx, target] of pictures) {
  const page = await browser.newPage({ viewport: { width: sizePx, height: sizePx } })
  const svg = readFileSync(path.join(here, source), 'utf8')
  await page.setContent(`<style>body { margin: 0 } svg { display: block; width: 100vw; height: 100vh }</style>${svg}`)
  await page.screenshot({ path: path.join(here, target) })
  await page.close()
}
await browser.close()
