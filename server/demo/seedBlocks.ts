import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import type { Feature, FeatureCollection, Polygon } from 'geojson'
import type { FarmActor } from '../database/actor.ts'
import { DEMO_FOLDER } from '../projectFolders.ts'
import { createBlock } from '../services/blocks/createBlock.ts'
import type { Services } from '../services/services.ts'
import { buildBlock } from './buildThings.ts'
import type { DrawnCrop } from './seedGrowing.ts'

/** The blocks of the drawing, or those of some codes. */
export async function seedBlocks(services: Services, actor: FarmActor, only?: readonly string[]): Promise<DrawnCrop[]> {
  const drawing = JSON.parse(await readFile(join(DEMO_FOLDER, 'demoBlocks.geojson'), 'utf8')) as FeatureCollection<Polygon>
  const drawn: DrawnCrop[] = []
  for (const feature of drawing.features as Feature<Polygon, Omit<DrawnCrop, 'id'> & { name: string }>[]) {
    const { code, name, crop, variety } = feature.properties
    if (only !== undefined && !only.includes(code)) continue
    const { block } = await createBlock(services, actor, buildBlock({ code, name, crop: `${crop}, ${variety}`, geometry: { ...feature.geometry } }))
    drawn.push({ id: block.id, code, crop, variety })
  }
  return drawn
}
