import { test as base } from '@playwright/test'
import { startAppServer, type AppServer } from './appServer'
import { makeDevice, type Device } from './browser'

interface StoryParts {
  /** A server of this test's own that holds the demo; it may be stopped and started. */
  readonly appServer: AppServer
  /** A phone of this test's own that keeps what it holds when its browser is closed. */
  readonly phone: Device
}

interface SharedParts {
  /** One server with the demo for all tests of a worker: to look, not to change. */
  readonly sharedServer: AppServer
}

/** Playwright's `test` with the product around it. */
export const story = base.extend<StoryParts, SharedParts>({
  appServer: async ({}, provide) => {
    const server = await startAppServer('demo')
    await provide(server)
    await server.close()
  },
  phone: async ({}, provide) => {
    const device = makeDevice('phone')
    await provide(device)
    device.discard()
  },
  sharedServer: [
    async ({}, provide) => {
      const server = await startAppServer('demo')
      await provide(server)
      await server.close()
    },
    { scope: 'worker' },
  ],
})
