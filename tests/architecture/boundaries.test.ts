import { ESLint } from 'eslint'
import { describe, expect, it } from 'vitest'

/** Each row plants one fault; a rule that stays silent is a broken rule. */
const FAULTS = [
  [
    'import-x/no-restricted-paths',
    'components/ui/planted.tsx',
    "import type { ApiClient } from '@/sync/api/createApiClient'\nexport type P = ApiClient",
  ],
  [
    'import-x/no-restricted-paths',
    'shared/schemas/planted.ts',
    "import { nothing } from '@/shared/api/defineEndpoint'\nexport const p = nothing",
  ],
  [
    'import-x/no-restricted-paths',
    'server/planted.ts',
    "import type { FieldStore } from '@/db/fieldStore.types'\nexport type P = FieldStore",
  ],
  [
    'import-x/no-restricted-paths',
    'db/planted.ts',
    "import type { ApiClient } from '@/sync/api/createApiClient'\nexport type P = ApiClient",
  ],
  ['no-restricted-imports', 'shared/compute/planted.ts', "import { z } from 'zod'\nexport const p = z"],
  [
    'no-restricted-imports',
    'components/planted.tsx',
    "import { Sequelize } from 'sequelize'\nexport const p = Sequelize",
  ],
  ['no-restricted-imports', 'shared/planted.ts', "import { compute } from '../elsewhere'\nexport const p = compute"],
  ['no-restricted-globals', 'components/planted.ts', 'export const p = fetch("/x")'],
  ['no-restricted-syntax', 'shared/compute/planted.ts', 'export const p = Math.random()'],
  ['no-restricted-syntax', 'shared/planted.ts', "export * from './format'"],
  ['import-x/no-default-export', 'components/planted.ts', 'export default 1'],
  ['@typescript-eslint/no-explicit-any', 'db/planted.ts', 'export const p = (x: any) => x'],
] as const

describe('the boundaries of the house', () => {
  const eslint = new ESLint()

  it.each(FAULTS)('%s finds a fault planted in %s', async (rule, filePath, code) => {
    const [result] = await eslint.lintText(`${code}\n`, { filePath })

    expect(result?.messages.map(({ ruleId }) => ruleId)).toContain(rule)
  })
})
