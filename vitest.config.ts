import path from 'node:path'
import { defineConfig } from 'vitest/config'

const root = import.meta.dirname
const alias = { '@': root }
const propertySeed = path.join(root, 'tests/support/propertySeed.ts')
/** A component test renders React Native through react-native-web in jsdom. */
const web = {
  resolve: {
    alias: [
      { find: '@', replacement: root },
      { find: /^react-native$/, replacement: 'react-native-web' },
      { find: /^react-native-svg$/, replacement: path.join(root, 'node_modules/react-native-svg/lib/module/index.js') },
    ],
    extensions: ['.web.tsx', '.web.ts', '.web.js', '.tsx', '.ts', '.mjs', '.js', '.json'],
  },
  define: { __DEV__: 'true' },
}

export default defineConfig({
  test: {
    projects: [
      {
        resolve: { alias },
        test: {
          name: 'unit',
          setupFiles: [propertySeed],
          environment: 'node',
          include: [
            'shared/**/*.test.ts',
            'sync/**/*.test.ts',
            'db/**/*.test.ts',
            'tests/conformance/**/*.test.ts',
            'tests/architecture/**/*.test.ts',
          ],
          testTimeout: 30_000,
        },
      },
      {
        resolve: { alias },
        test: {
          name: 'server',
          setupFiles: [propertySeed],
          environment: 'node',
          include: ['server/**/*.test.ts', 'tests/sync/**/*.test.ts', 'tests/server/**/*.test.ts'],
          globalSetup: [path.join(root, 'tests/support/testDatabase.global.ts')],
          testTimeout: 60_000,
          hookTimeout: 120_000,
          maxWorkers: 2,
        },
      },
      {
        ...web,
        test: {
          name: 'components',
          environment: 'jsdom',
          include: ['components/**/*.test.{ts,tsx}'],
          server: { deps: { inline: [/react-native/, /expo/, /@expo/] } },
          testTimeout: 30_000,
        },
      },
    ],
  },
})
