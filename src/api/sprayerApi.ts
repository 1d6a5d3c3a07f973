import { sprayerSchema, type Sprayer } from '../../shared/contract/farm.ts'
import { allPages } from './allPages.ts'

/** The sprayers of a farm. */
export const sprayerApi = {
  list: (farmId: string): Promise<Sprayer[]> => allPages(`/farms/${farmId}/sprayers`, sprayerSchema),
}
