import importX from 'eslint-plugin-import-x'
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript'
import reactHooks from 'eslint-plugin-react-hooks'
import tseslint from 'typescript-eslint'

/** Who may not know whom: target folder → the folders it must not import. */
const forbidden = {
  shared: ['app', 'components', 'db', 'sync', 'server', 'tests'],
  'shared/schemas': ['shared/api', 'shared/messages'],
  'shared/compute': ['shared/schemas', 'shared/api', 'shared/messages'],
  db: ['app', 'components', 'sync', 'server', 'tests'],
  sync: ['app', 'components', 'server', 'tests'],
  components: ['app', 'server', 'tests'],
  'components/ui': ['db', 'sync'],
  'components/charts': ['db', 'sync'],
  app: ['server', 'tests'],
  server: ['app', 'components', 'db', 'sync', 'tests'],
}
const zones = Object.entries(forbidden).map(([target, from]) => ({
  target: `./${target}`,
  from: from.map((folder) => `./${folder}`),
  message: `${target}/ must not know ${from.join(', ')}.`,
}))
/** A test stands beside its code and may use what tests/support builds. */
const withoutTests = (zone) => ({ ...zone, from: zone.from.filter((folder) => folder !== './tests') })
const features = [
  'sheet',
  'street',
  'bag',
  'today',
  'review',
  'stock',
  'flows',
  'factors',
  'rounds',
  'loads',
  'people',
  'district',
  'me',
]
for (const feature of features) {
  zones.push({
    target: `./components/${feature}`,
    from: features.filter((other) => other !== feature).map((other) => `./components/${other}`),
    message: 'Features meet in components/ui or shared, not in each other.',
  })
}

const serverOnly = [
  'sequelize',
  'express',
  'pg',
  'umzug',
  'pg-boss',
  'nodemailer',
  'multer',
  'jimp',
  'passport',
  'passport-*',
]
const noBarrels = { selector: 'ExportAllDeclaration', message: 'No barrels: import from the file that holds it.' }
const noClock = [
  {
    selector: "CallExpression[callee.object.name='Math'][callee.property.name='random']",
    message: 'Randomness is an argument.',
  },
  {
    selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']",
    message: 'The clock is an argument.',
  },
]

export default tseslint.config(
  { ignores: ['node_modules', '.build', '.expo', '.local', 'dist', 'public', 'coverage', 'test-results', '**/*.d.ts'] },
  ...tseslint.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    plugins: { 'import-x': importX, 'react-hooks': reactHooks },
    settings: {
      ...importX.flatConfigs.typescript.settings,
      'import-x/resolver-next': [createTypeScriptImportResolver()],
    },
    rules: {
      'import-x/no-restricted-paths': ['error', { zones }],
      'import-x/no-cycle': ['error', { maxDepth: 8 }],
      'import-x/no-default-export': 'error',
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            { group: [...serverOnly, 'node:*'], message: 'Only server/ and tests/ use these.' },
            { regex: '^\\.\\./', message: 'Use @/ for anything outside this folder.' },
          ],
        },
      ],
      'no-restricted-globals': ['error', { name: 'fetch', message: 'Only sync/ and tests/ are on the network.' }],
      'no-restricted-syntax': ['error', noBarrels],
      'react-hooks/rules-of-hooks': 'error',
      'react-hooks/exhaustive-deps': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }],
      'max-lines-per-function': ['error', { max: 60, skipBlankLines: true, skipComments: true }],
      complexity: ['error', 10],
    },
  },
  {
    files: ['app/**/*.tsx', 'components/**/*.tsx'],
    rules: {
      'max-lines-per-function': ['error', { max: 150, skipBlankLines: true, skipComments: true }],
      complexity: ['error', 15],
    },
  },
  {
    files: ['app/**/*.tsx', '*.config.{ts,mjs,js}', 'tests/support/e2e.global.ts'],
    rules: { 'import-x/no-default-export': 'off' },
  },
  {
    files: ['shared/compute/**/*.ts'],
    ignores: ['**/*.test.ts'],
    rules: {
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            {
              regex: '^(?!\\./|@/shared/compute/|@stdlib/|h3-js$|geographiclib-geodesic$)',
              message: 'shared/compute imports only its own and its special functions.',
            },
          ],
        },
      ],
      'no-restricted-syntax': ['error', noBarrels, ...noClock],
      complexity: ['error', 15],
    },
  },
  {
    files: ['shared/**/*.ts'],
    ignores: ['shared/compute/**', '**/*.test.ts'],
    rules: { 'no-restricted-syntax': ['error', noBarrels, ...noClock] },
  },
  {
    files: ['server/**/*.ts', 'tests/**/*.ts', 'tests/**/*.tsx', '*.config.ts'],
    rules: {
      'no-restricted-imports': [
        'error',
        { patterns: [{ regex: '^\\.\\./', message: 'Use @/ for anything outside this folder.' }] },
      ],
    },
  },
  { files: ['sync/**/*.ts', 'tests/**/*.ts'], rules: { 'no-restricted-globals': 'off' } },
  {
    files: ['**/*.test.{ts,tsx}', 'tests/**/*.ts'],
    rules: {
      'max-lines': ['error', { max: 500, skipBlankLines: true, skipComments: true }],
      'max-lines-per-function': 'off',
      'import-x/no-restricted-paths': [
        'error',
        { zones: zones.map(withoutTests).filter(({ from }) => from.length > 0) },
      ],
      'no-restricted-imports': [
        'error',
        { patterns: [{ regex: '^\\.\\./', message: 'Use @/ for anything outside this folder.' }] },
      ],
      'no-restricted-globals': 'off',
    },
  },
  { files: ['**/*.mjs', '**/*.config.js', '**/*.cjs'], rules: { '@typescript-eslint/no-require-imports': 'off' } },
  {
    // A factory whose functions close over one state reads better whole than cut into pieces that pass the state on.
    files: ['sync/create*.ts', 'sync/react/*.{ts,tsx}', 'db/create*.ts'],
    ignores: ['**/*.test.ts'],
    rules: { 'max-lines-per-function': ['error', { max: 100, skipBlankLines: true, skipComments: true }] },
  },
)
