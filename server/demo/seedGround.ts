import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import type { FeatureCollection, LineString, Point, Polygon } from 'geojson'
import type { CreateGround, CreateSite } from '../../shared/contract/ground.ts'
import type { FarmActor } from '../database/actor.ts'
import { DEMO_FOLDER } from '../projectFolders.ts'
import { createGround } from '../services/ground/groundFeatures.ts'
import { createSite } from '../services/ground/sites.ts'
import type { Services } from '../services/services.ts'
import { buildGround, buildSite } from './buildThings.ts'

/** What one drawing is: a piece of the ground plan, something to keep clear of, or both, as a brook is. */
interface Drawn {
  name: string | null
  ground?: Pick<CreateGround, 'kind' | 'widthM'>
  site?: Pick<CreateSite, 'kind' | 'keepClearM'>
}

/** The demo farm's brook, lanes, hedges and buildings, and what its sprays keep clear of. */
export async function seedGround(services: Services, actor: FarmActor): Promise<void> {
  const drawing = JSON.parse(await readFile(join(DEMO_FOLDER, 'demoGround.geojson'), 'utf8')) as FeatureCollection<LineString | Point | Polygon, Drawn>
  for (const { geometry, properties: { name, ground, site } } of drawing.features) {
    if (ground) await createGround(services, actor, buildGround({ ...ground, name, geometry: { ...geometry } }))
    if (site && name !== null) await createSite(services, actor, buildSite({ ...site, name, geometry: { ...geometry } }))
  }
}

/** The neighbour's own: a well and the track to it. */
export async function seedNeighbourGround(services: Services, actor: FarmActor): Promise<void> {
  await createSite(services, actor, buildSite({ name: 'Kiln well', keepClearM: '25', geometry: { type: 'Point', coordinates: [-123.2949, 44.6097] } }))
  await createGround(services, actor, buildGround({ kind: 'track', name: 'Kiln track', widthM: '4', geometry: { type: 'LineString', coordinates: [[-123.2962, 44.6098], [-123.2949, 44.6097], [-123.2928, 44.6099]] } }))
}
