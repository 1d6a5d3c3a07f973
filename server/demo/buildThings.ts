import { v7 as uuidV7 } from 'uuid'
import { createBlockSchema, type CreateBlock } from '../../shared/contract/block.ts'
import { createLotSchema, createMaterialSchema, type CreateLot, type CreateMaterial } from '../../shared/contract/input.ts'
import { createGroundSchema, createSiteSchema, type CreateGround, type CreateSite } from '../../shared/contract/ground.ts'
import { createRecordSchema, type CreateRecord } from '../../shared/contract/recordChanges.ts'
import { type RecordContentInput } from '../../shared/contract/recordContent.ts'
import type { z } from 'zod'

/** A hundred metres square near 44.6° N, moved east by its number so that none overlap. */
export function squareAt(place: number, sizeDegrees = 0.001): CreateBlock['geometry'] {
  const west = -123.31 + place * 0.002
  const south = 44.61
  const [east, north] = [west + sizeDegrees, south + sizeDegrees]
  const round = (value: number) => Number(value.toFixed(7))
  const ring = [[west, south], [east, south], [east, north], [west, north], [west, south]].map(([lon = 0, lat = 0]) => [round(lon), round(lat)])
  return { type: 'Polygon', coordinates: [ring] }
}

/** A valid block; a caller names only what it is about. */
export function buildBlock(overrides: Partial<z.input<typeof createBlockSchema>> = {}): CreateBlock {
  return createBlockSchema.parse({ id: uuidV7(), code: 'B1', name: 'First piece', geometry: squareAt(0), ...overrides })
}

/** A valid material measured by volume, allowed, with no label. */
export function buildMaterial(overrides: Partial<z.input<typeof createMaterialSchema>> = {}): CreateMaterial {
  return createMaterialSchema.parse({
    id: uuidV7(), name: 'Nettle ferment', kind: 'ferment', measuredIn: 'volume', organicStatus: 'allowed', statusBasis: 'System plan, line 3', ...overrides,
  })
}

/** A valid lot of 100 L. */
export function buildLot(overrides: Partial<z.input<typeof createLotSchema>> & { materialId: string }): CreateLot {
  return createLotSchema.parse({
    id: uuidV7(), code: 'N-1', origin: 'made', receivedOn: '2026-03-02', quantity: { value: '100', unit: 'L' }, ...overrides,
  })
}

/** A valid record of one block line, drenched, 1 part to 20, as it happened. */
export function buildRecord(
  overrides: Partial<RecordContentInput> & { blockId: string; materialId: string; lotId: string | null; id?: string; startedAt?: string; endedAt?: string },
): CreateRecord {
  const { blockId, materialId, lotId, startedAt = '2026-06-16T13:00:00Z', endedAt = '2026-06-16T13:40:00Z', ...rest } = overrides
  return createRecordSchema.parse({
    id: uuidV7(),
    method: 'drench',
    lines: [{ blockId, startedAt, endedAt, amount: null }],
    components: [{ materialId, lotId, basis: { kind: 'ratio', parts: '20' } }],
    water: { sizedFrom: 'water', value: '400', unit: 'L', source: 'Rain tank 2' },
    ...rest,
  })
}

/** A well with 30 m round it. */
export function buildSite(overrides: Partial<z.input<typeof createSiteSchema>> = {}): CreateSite {
  return createSiteSchema.parse({ id: uuidV7(), kind: 'well', name: 'Yard well', geometry: { type: 'Point', coordinates: [-123.3133517, 44.6076692] }, keepClearM: '30', ...overrides })
}

/** A hedge of some 110 m. */
export function buildGround(overrides: Partial<z.input<typeof createGroundSchema>> = {}): CreateGround {
  return createGroundSchema.parse({ id: uuidV7(), kind: 'hedge', geometry: { type: 'LineString', coordinates: [[-123.3123, 44.607], [-123.3123, 44.608]] }, ...overrides })
}
