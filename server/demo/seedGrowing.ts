import { v7 as uuidV7 } from 'uuid'
import { createBedSchema } from '../../shared/contract/bed.ts'
import { updateBlockSchema } from '../../shared/contract/blockChanges.ts'
import { createFarmEventSchema } from '../../shared/contract/farmEvent.ts'
import { putLandSchema, type Land } from '../../shared/contract/land.ts'
import { createPlantingSchema } from '../../shared/contract/planting.ts'
import { addDays } from '../../shared/time/calendar.ts'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import { seasonOf } from '../../shared/time/seasonOf.ts'
import type { FarmActor } from '../database/actor.ts'
import { createBed } from '../services/blocks/beds.ts'
import { createFarmEvent, withdrawFarmEvent } from '../services/blocks/farmEvents.ts'
import { createPlanting } from '../services/blocks/plantings.ts'
import { putLand } from '../services/blocks/putLand.ts'
import { getBlock } from '../services/blocks/readBlocks.ts'
import { updateBlock } from '../services/blocks/updateBlock.ts'
import type { Services } from '../services/services.ts'
import { DEMO_BEDS, DEMO_COUNTS, DEMO_CROPS, DEMO_EVENTS, type DemoCrop } from './demoGrowing.ts'
import { DEMO_ZONE } from './demoZone.ts'

/** What stands on a block of the drawing. */
export interface DrawnCrop { id: string; code: string; crop: string; variety: string }

const CERTIFIED: Partial<Land> = { status: 'certified', statusSince: '2019-04-02', tenure: 'own' }
/** Land that is not like the rest; what is null nobody has written down. */
const LAND: Record<string, Partial<Land> | null> = {
  A3: { ...CERTIFIED, lastProhibited: { substance: 'weedkiller', on: '2016-04-01', proof: 'letter of the seller, in the blue file' } },
  N1: { status: 'transition', statusSince: '2025-05-01', lastProhibited: { substance: 'weedkiller on the stubble', on: '2025-04-18', proof: 'invoice of the contractor' }, tenure: 'rented', tenureUntil: '2031-02-28' },
  V4: { ...CERTIFIED, tenure: 'rented', tenureUntil: '2029-02-28', tenureNote: 'From the mill; no sprays within its garden' },
  H1: null,
}

interface Farmers { manager: FarmActor; applicator: FarmActor }

/** Land status, plantings, beds and rows, and what else was done, on the blocks as they are drawn. */
export async function seedGrowing(services: Services, past: Services, { manager, applicator }: Farmers, crops: readonly DrawnCrop[]): Promise<void> {
  const today = civilDateIn(DEMO_ZONE, services.clock.now().toISOString())
  const ids = new Map(crops.map(({ code, id }) => [code, id]))
  for (const drawn of crops) {
    const land = drawn.code in LAND ? LAND[drawn.code] : CERTIFIED
    if (land) await putLand(past, manager, drawn.id, putLandSchema.parse({ revision: 1, ...land }))
    const crop = DEMO_CROPS[drawn.crop]
    if (crop) await createPlanting(services, manager, plantingOf(drawn, crop, today))
  }
  for (const { block, from, to, ...bed } of DEMO_BEDS) {
    await createBed(services, manager, createBedSchema.parse({ id: uuidV7(), blockId: ids.get(block), ...bed, fromNumber: from, toNumber: to, count: to - from + 1 }))
  }
  for (const { kind, blocks, daysAgo, note, by, takenBack } of DEMO_EVENTS) {
    const actor = by === 'tam' ? applicator : manager
    const event = createFarmEventSchema.parse({ id: uuidV7(), kind, note, on: addDays(today, -daysAgo), blockIds: blocks.map((code) => ids.get(code)) })
    await createFarmEvent(services, actor, event)
    if (takenBack !== undefined) await withdrawFarmEvent(services, actor, event.id, { reason: takenBack })
  }
}

function plantingOf({ id, code, crop, variety }: DrawnCrop, { planted, picks, ...more }: DemoCrop, today: string) {
  const season = seasonOf(today, '03-01')
  const dayOf = (year: number, day: string) => `${year}-${day}`
  // This season's, and, once it is over, the next one's beside it.
  const years = (to: string) => (dayOf(season, to) < today ? [season, season + 1] : [season])
  return createPlantingSchema.parse({
    id: uuidV7(), blockId: id, crop: crop.replace(', young', ''), variety: variety === 'mixed' ? null : variety, ...more, plants: DEMO_COUNTS[code] ?? null,
    plantedOn: 'year' in planted ? `${planted.year}-03-20` : addDays(today, -planted.daysAgo),
    harvests: picks.flatMap(({ from, to, note }) => years(to).map((year) => ({ from: dayOf(year, from), to: dayOf(year, to), note }))),
  })
}

/** How far the hedge went back, degrees of longitude: about 6 m. */
const HEDGE = 0.00007
const HEDGE_LINE = -123.31071

/** The plum slip was walked anew this morning: its records rest on the outline before. */
export async function seedRedrawn(services: Services, manager: FarmActor, blockId: string): Promise<void> {
  const { geometry, revision } = await getBlock(services, manager, blockId)
  if (geometry.type !== 'Polygon') throw new Error('The plum slip is drawn in one piece')
  const moved = geometry.coordinates.map((ring) => ring.map(([lon, lat]) => [lon > HEDGE_LINE ? Number((lon - HEDGE).toFixed(7)) : lon, lat]))
  await updateBlock(services, manager, blockId, updateBlockSchema.parse({
    revision, geometry: { type: 'Polygon', coordinates: moved }, note: 'The hedge on the neighbour’s side was set back; walked with a tape',
  }))
}
