import { fileURLToPath } from 'node:url'
import vue from '@vitejs/plugin-vue'
import vuetify from 'vite-plugin-vuetify'
import { defineConfig } from 'vitest/config'

const alias = { '@': fileURLToPath(new URL('./src', import.meta.url)) }
/** Where the API listens while the page is developed. */
const api = process.env.GIRDWELL_API ?? 'http://127.0.0.1:4780'

export default defineConfig({
  plugins: [vue(), vuetify({ autoImport: true })],
  resolve: { alias },
  worker: { format: 'es' },
  // Vuetify discovered part by part makes the dev server reload pages in mid-flow.
  optimizeDeps: { exclude: ['vuetify'] },
  build: { outDir: 'dist/client', emptyOutDir: true, sourcemap: false },
  server: { port: 5173, strictPort: true, proxy: { '/api': { target: api } } },
  test: {
    projects: [
      {
        resolve: { alias },
        test: {
          name: 'unit',
          environment: 'node',
          include: ['tests/unit/**/*.test.ts', 'tests/worker/**/*.test.ts'],
        },
      },
      {
        resolve: { alias },
        plugins: [vue(), vuetify({ autoImport: true })],
        test: {
          name: 'dom',
          environment: 'happy-dom',
          include: ['tests/dom/**/*.test.ts'],
          setupFiles: ['tests/helpers/domSetup.ts'],
          testTimeout: 20_000,
          server: { deps: { inline: ['vuetify'] } },
        },
      },
      {
        test: { name: 'reference', environment: 'node', include: ['tests/reference/**/*.test.ts'] },
      },
      {
        test: {
          name: 'api',
          environment: 'node',
          include: ['tests/api/**/*.test.ts'],
          testTimeout: 20_000,
          hookTimeout: 30_000,
        },
      },
      {
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: ['tests/e2e/globalSetup.ts'],
          fileParallelism: false,
          // A starved browser is no fault of the product; a fault of the product fails twice.
          retry: 1,
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
})
