import js from '@eslint/js'
import globals from 'globals'
import prettier from 'eslint-config-prettier'
import vue from 'eslint-plugin-vue'
import ts from 'typescript-eslint'

/**
 * The import arrows of DEVELOPERS.md: src, server and workers look to shared, shared to nothing;
 * one door to the workers (src/clients/solverClient.ts), one to the solver in the server (services/verification).
 */
const closed = (why, ...group) => ({ group, message: why })
const arrows = (files, patterns, ignores = []) => ({
  files,
  ignores,
  rules: { 'no-restricted-imports': ['error', { patterns }] },
})
const src = closed('src is the browser application: nothing outside it may import it', '@/*', '**/src/**')
const server = closed('the server is reached through the API only', '#server/*', '**/server/**')
const workers = closed(
  'workers are reached through src/clients/solverClient.ts only',
  '#workers/*',
  '**/workers/**',
)
const tests = closed('nothing imports tests', '**/tests/**')
const vueParts = closed('no framework here', 'vue', 'vue-*', 'pinia', 'vuetify', 'vuetify/*', '@vueuse/*')
const comlink = closed('Comlink belongs to the solver client and the worker entry', 'comlink')
const node = closed(
  'pure code knows no host',
  'node:*',
  'express',
  'better-sqlite3',
  'drizzle-orm',
  'drizzle-orm/*',
)

export default ts.config(
  { ignores: ['node_modules', 'dist', 'data', 'coverage', 'server/db/migrations'] },
  js.configs.recommended,
  ...ts.configs.recommended,
  ...vue.configs['flat/recommended'],
  {
    files: ['**/*.vue'],
    languageOptions: { parserOptions: { parser: ts.parser } },
    rules: { 'no-undef': 'off', 'vue/multi-word-component-names': 'off' },
  },
  { files: ['**/*.ts'], rules: { 'no-undef': 'off' } },
  { files: ['**/*.{js,mjs}'], languageOptions: { globals: globals.node } },
  {
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/ban-ts-comment': 'error',
      eqeqeq: 'error',
      'no-console': ['error', { allow: ['error', 'warn'] }],
    },
  },
  {
    files: ['server/**/*.mjs', 'server/index.ts', 'tests/**', 'workers/analyse.ts'],
    rules: { 'no-console': 'off' },
  },

  arrows(['shared/**/*.ts'], [src, server, workers, tests, vueParts, comlink, node]),
  arrows(['workers/solver/**/*.ts'], [src, server, tests, vueParts, comlink, node]),
  arrows(
    ['workers/solver/numeric/**/*.ts'],
    [
      src,
      server,
      tests,
      vueParts,
      comlink,
      node,
      closed('numeric knows nothing of sections', '#shared/*', '../*'),
    ],
  ),
  arrows(['workers/*.ts'], [src, server, tests, vueParts]),
  arrows(['src/**/*.{ts,vue}'], [server, workers, tests, comlink, node], ['src/clients/solverClient.ts']),
  arrows(['src/clients/solverClient.ts'], [server, workers, tests, node]),
  arrows(
    ['src/drawing/**/*.ts', 'src/plotting/**/*.ts'],
    [
      server,
      workers,
      tests,
      comlink,
      node,
      vueParts,
      closed(
        'drawing and plotting are pure',
        '@/components/*',
        '@/stores/*',
        '@/composables/*',
        '@/clients/*',
        '@/views/*',
      ),
    ],
  ),
  arrows(
    ['src/stores/**/*.ts'],
    [
      server,
      workers,
      tests,
      comlink,
      node,
      closed('stores know clients, nothing above them', '@/components/**', '@/composables/**', '@/views/**'),
    ],
  ),
  arrows(
    ['src/components/base/**/*.vue'],
    [
      server,
      workers,
      tests,
      comlink,
      node,
      closed('base parts know no domain', '@/stores/*', '@/clients/*', '@/views/*'),
    ],
  ),
  arrows(['server/**/*.ts'], [src, workers, tests, vueParts, comlink], ['server/services/verification*.ts']),
  arrows(['server/services/verification*.ts'], [src, tests, vueParts, comlink]),
  prettier,
)
