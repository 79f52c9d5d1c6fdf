import { mkdtempSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { chromium, type BrowserContext, type BrowserContextOptions, type LaunchOptions } from '@playwright/test'

/** Debian's Chromium, silent towards the world, with a camera that films a test picture. */
export const browserLaunch: LaunchOptions = {
  executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
  args: [
    '--no-sandbox',
    '--disable-quic',
    '--no-first-run',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
    '--disable-dev-shm-usage',
    '--use-fake-device-for-media-stream',
    '--use-fake-ui-for-media-stream',
  ],
}

/** Sizes at which every screen is looked at. */
export const screens = {
  phone: { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true, deviceScaleFactor: 2 },
  desk: { viewport: { width: 1440, height: 900 } },
} as const satisfies Record<string, BrowserContextOptions>

const everywhere: BrowserContextOptions = {
  locale: 'en-GB',
  timezoneId: 'Europe/London',
  permissions: ['geolocation', 'camera'],
  reducedMotion: 'reduce',
}

/** A browser whose profile stays on disk, so that closing and opening it is what a person does. */
export interface Device {
  /** Opens the browser with what it kept. Close the context to close the browser. */
  open(options?: BrowserContextOptions): Promise<BrowserContext>
  /** Throws the profile away. */
  discard(): void
}

/** @param screen size of the device */
export function makeDevice(screen: keyof typeof screens): Device {
  const profile = mkdtempSync(path.join(os.tmpdir(), 'tallystone-profile-'))
  return {
    open: (options = {}) =>
      chromium.launchPersistentContext(profile, { ...browserLaunch, ...everywhere, ...screens[screen], ...options }),
    discard: () => rmSync(profile, { recursive: true, force: true, maxRetries: 3 }),
  }
}

/** What the configuration gives each test's own page. */
export const contextDefaults = everywhere
