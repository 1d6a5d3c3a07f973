import { calibrationSchema, type Calibration } from '../../shared/contract/calibration.ts'
import { sprayerSchema, type Sprayer } from '../../shared/contract/farm.ts'
import { allPages } from './allPages.ts'

/** The sprayers of a farm, and how they were measured. */
export const sprayerApi = {
  list: (farmId: string): Promise<Sprayer[]> => allPages(`/farms/${farmId}/sprayers`, sprayerSchema),
  calibrations: (farmId: string, sprayerId: string): Promise<Calibration[]> => allPages(`/farms/${farmId}/calibrations`, calibrationSchema, { sprayerId }),
}
