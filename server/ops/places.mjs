import path from 'node:path'

/** Folder of the checkout. */
export const ROOT = path.resolve(import.meta.dirname, '..', '..')

/** What is made here and never committed. */
export const places = {
  build: path.join(ROOT, '.build'),
  web: path.join(ROOT, '.build', 'web'),
  server: path.join(ROOT, '.build', 'server'),
  local: path.join(ROOT, '.local'),
  secrets: path.join(ROOT, '.local', 'secrets.json'),
  modules: path.join(ROOT, 'node_modules'),
}
