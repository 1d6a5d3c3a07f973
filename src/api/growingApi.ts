import { bedSchema, type Bed } from '../../shared/contract/bed.ts'
import { farmEventSchema, type FarmEvent } from '../../shared/contract/farmEvent.ts'
import { plantingSchema, type Planting } from '../../shared/contract/planting.ts'
import { allPages } from './allPages.ts'

/** What grows on one block, its beds and rows, and what else was done on it; writes go through submit(command). */
export const growingApi = {
  plantings: (farmId: string, blockId: string): Promise<Planting[]> => allPages(`/farms/${farmId}/plantings`, plantingSchema, { blockId }),
  beds: (farmId: string, blockId: string): Promise<Bed[]> => allPages(`/farms/${farmId}/beds`, bedSchema, { blockId }),
  /** Newest day first. */
  events: (farmId: string, blockId: string): Promise<FarmEvent[]> => allPages(`/farms/${farmId}/farm-events`, farmEventSchema, { blockId }),
}
