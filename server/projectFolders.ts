import { existsSync } from 'node:fs'
import { dirname, join } from 'node:path'

/** The checkout: the first folder upwards that has the package in it, for sources and built files alike. */
function findProject(): string {
  let folder = import.meta.dirname
  while (!existsSync(join(folder, 'package.json'))) {
    const above = dirname(folder)
    if (above === folder) throw new Error('No package.json above the server')
    folder = above
  }
  return folder
}

const PROJECT = findProject()
/** The demo farm's drawings, read at seeding. */
export const DEMO_FOLDER = join(PROJECT, 'server', 'demo')
/** The built client. */
export const CLIENT_FOLDER = join(PROJECT, 'dist', 'client')
