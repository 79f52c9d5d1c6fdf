import { defineConfig } from '@playwright/test'
import { browserLaunch, contextDefaults, screens } from '@/tests/support/browser'

/**
 * Stories against the built product (`npm run build` before). `x.phone.spec.ts` and `x.desk.spec.ts` run at one size,
 * `x.story.spec.ts` once (it opens its own browsers), all others at both.
 */
export default defineConfig({
  testDir: './tests/e2e',
  outputDir: './test-results',
  globalSetup: './tests/support/e2e.global.ts',
  workers: 1,
  // a loaded machine may be late once; a fault is there each time
  retries: process.env.CI ? 2 : 0,
  forbidOnly: true,
  timeout: 120_000,
  expect: { timeout: 10_000 },
  reporter: 'list',
  use: { ...contextDefaults, launchOptions: browserLaunch, screenshot: 'only-on-failure', trace: 'retain-on-failure' },
  projects: [
    { name: 'phone', use: screens.phone, testIgnore: '**/*.desk.spec.ts' },
    { name: 'desk', use: screens.desk, testIgnore: ['**/*.phone.spec.ts', '**/*.story.spec.ts'] },
  ],
})
