import { randomUUID } from 'node:crypto'
import type { BrowserContext } from '@playwright/test'
import { blockSchema, type Block, type Boundary } from '../../../shared/contract/block.ts'
import { typedPoints } from './blockForm.ts'
import { farmApi, signInTo, type FarmApi } from './demoFarm.ts'
import { openNewFarm } from './importForm.ts'
import { square } from './things.ts'

/** South-west corner and side of a field, degrees: 79 m by 111 m. */
export interface Place { west: number; south: number; size: number }

/** One farm for all tests of a file: an account may own no more than twenty. */
let farmId: string | null = null
let places = 0

/** A farm whose blocks only the tests of this file draw on. */
export async function openOwnFarm(context: BrowserContext): Promise<FarmApi> {
  if (farmId === null) farmId = await openNewFarm(context)
  else {
    await signInTo(context.request, 'neighbour')
    await context.addInitScript((id) => { localStorage.setItem('drenchleaf.farm', id) }, farmId)
  }
  return farmApi(context.request, farmId)
}

/** Ground that no other test draws on, 800 m from the one before. */
export function ownPlace(): Place {
  places += 1
  return { west: -123.3 + places * 0.01, south: 44.6, size: 0.001 }
}

/** A field twice as wide as one there, as one types it. */
export const twiceAsWide = ({ west, south, size }: Place): string =>
  typedPoints([[west, south], [west + 2 * size, south], [west + 2 * size, south + size], [west, south + size]])

export const makeField = (farm: FarmApi, code: string, at: Place | Boundary): Promise<Block> =>
  farm.post('/blocks', { id: randomUUID(), code, name: `Field ${code}`, geometry: 'type' in at ? at : square(at) }, blockSchema)
