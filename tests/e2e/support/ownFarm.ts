import { randomUUID } from 'node:crypto'
import type { BrowserContext } from '@playwright/test'
import { blockSchema, type Block, type Boundary } from '../../../shared/contract/block.ts'
import { typedPoints } from './blockForm.ts'
import { farmApi, type FarmApi } from './demoFarm.ts'
import { openNewFarm } from './importForm.ts'
import { square } from './things.ts'

/** South-west corner and side of the first field, degrees: 79 m by 111 m. */
export const FIELD = { west: -123.3, south: 44.6, size: 0.001 }
const { west, south, size } = FIELD
/** A field twice as wide, as one types it. */
export const TWICE = typedPoints([[west, south], [west + 2 * size, south], [west + 2 * size, south + size], [west, south + size]])

/** A farm of its own, whose blocks nobody else draws on. */
export async function openOwnFarm(context: BrowserContext): Promise<FarmApi> {
  return farmApi(context.request, await openNewFarm(context))
}

export const makeField = (farm: FarmApi, code: string, geometry: Boundary = square(FIELD)): Promise<Block> =>
  farm.post('/blocks', { id: randomUUID(), code, name: `Field ${code}`, geometry }, blockSchema)
