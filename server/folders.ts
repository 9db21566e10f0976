import { existsSync } from 'node:fs'
import { fileURLToPath } from 'node:url'

/** Whether this runs from dist/server, bundled, or from the sources under tsx or Vitest. */
export const bundled = !import.meta.url.endsWith('.ts')

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url))

export const migrationsFolder = bundled ? here('./migrations') : here('./db/migrations')

/** The built page; null where there is none, as in development, when Vite serves it. */
export function findClientFolder(): string | null {
  const folder = bundled ? here('../client') : here('../dist/client')
  return existsSync(`${folder}/index.html`) ? folder : null
}
