import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import { blockSchema, type Block, type Boundary } from '../../../shared/contract/block.ts'
import { pageOf } from '../../../shared/contract/common.ts'
import { sprayerSchema, type Sprayer } from '../../../shared/contract/farm.ts'
import { lotSchema, materialSchema, type createMaterialSchema, type Lot, type Material } from '../../../shared/contract/input.ts'
import { recordSchema, type ApplicationRecord } from '../../../shared/contract/record.ts'
import { PASSWORD, type FarmApi } from './demoFarm.ts'
import { unique } from './unique.ts'

/** Tests put their blocks on one another in this square of the demo farm: what is unlikely about it is said when they are made. */
const SQUARE = { west: -123.3126, south: 44.6043, size: 0.0009 }
const REASONS = [{ code: 'geometry.overlap', reason: 'made by a test' }, { code: 'geometry.far_from_farm', reason: 'made by a test' }]
const DAY_MS = 86_400_000

/** A square of about 100 m by 70 m. */
export function square({ west, south, size }: { west: number; south: number; size: number }): Boundary {
  const [east, north] = [west + size, south + size]
  const ring = [[west, south], [east, south], [east, north], [west, north], [west, south]]
  return { type: 'Polygon', coordinates: [ring.map(([lon = 0, lat = 0]): [number, number] => [Number(lon.toFixed(7)), Number(lat.toFixed(7))])] }
}

/** The civil day so many days from today, by UTC: a lot's day need not be exact to the zone. */
export function dayFromNow(days: number): string {
  return new Date(Date.now() + days * DAY_MS).toISOString().slice(0, 10)
}

export function makeBlock(api: FarmApi): Promise<Block> {
  return api.post('/blocks', { id: randomUUID(), code: unique('B'), name: 'Test piece', geometry: square(SQUARE), acknowledged: REASONS }, blockSchema)
}

export function makeMaterial(api: FarmApi, facts: Partial<z.input<typeof createMaterialSchema>> = {}): Promise<Material> {
  return api.post('/materials', {
    id: randomUUID(), name: unique('Ferment '), kind: 'ferment', measuredIn: 'volume', organicStatus: 'allowed', statusBasis: 'System plan, line 3', ...facts,
  }, materialSchema)
}

export function makeLot(api: FarmApi, materialId: string, litres = '100'): Promise<Lot> {
  return api.post('/lots', {
    id: randomUUID(), materialId, code: unique('L-'), origin: 'made', receivedOn: dayFromNow(-3), quantity: { value: litres, unit: 'L' }, expiresOn: dayFromNow(60),
  }, lotSchema)
}

export function makeSprayer(api: FarmApi, tankL = '120'): Promise<Sprayer> {
  return api.post('/sprayers', { id: randomUUID(), code: unique('T'), name: 'Test tank', tankL }, sprayerSchema)
}

/** What one record needs, each thing its own. */
export interface Things {
  block: Block
  first: { material: Material; lot: Lot }
  second: { material: Material; lot: Lot }
  sprayer: Sprayer
}

export async function makeThings(manager: FarmApi): Promise<Things> {
  const input = async (): Promise<Things['first']> => {
    const material = await makeMaterial(manager)
    return { material, lot: await makeLot(manager, material.id) }
  }
  return { block: await makeBlock(manager), first: await input(), second: await input(), sprayer: await makeSprayer(manager) }
}

/** A drench that ended a minute ago and waits for its signature. */
export async function makeEndedRecord(api: FarmApi, { block, first, sprayer }: Things): Promise<ApplicationRecord> {
  const at = (minutesAgo: number): string => new Date(Date.now() - minutesAgo * 60_000).toISOString()
  return api.post('/records', {
    id: randomUUID(), method: 'drench', lines: [{ blockId: block.id, startedAt: at(31), endedAt: at(1) }],
    components: [{ materialId: first.material.id, lotId: first.lot.id, basis: { kind: 'ratio', parts: '20' } }],
    water: { sizedFrom: 'water', value: '200', unit: 'L' }, sprayerId: sprayer.id,
  }, recordSchema)
}

/** The same, signed over the API. */
export async function makeSignedRecord(api: FarmApi, things: Things): Promise<ApplicationRecord> {
  const { id } = await makeEndedRecord(api, things)
  return api.post(`/records/${id}/sign`, { password: PASSWORD }, recordSchema)
}

/** Every block of the farm. */
export async function listBlocks(api: FarmApi): Promise<Block[]> {
  const { items } = await api.get('/blocks?limit=200', pageOf(blockSchema))
  return items
}

export async function listLots(api: FarmApi, materialId: string): Promise<Lot[]> {
  const { items } = await api.get(`/lots?limit=200&materialId=${materialId}`, pageOf(lotSchema))
  return items
}
