import { lotSchema, type Lot } from '../../shared/contract/input.ts'
import { allPages } from './allPages.ts'

/** The lots of a farm, or of one of its materials. */
export const lotApi = {
  list: (farmId: string, materialId?: string): Promise<Lot[]> =>
    allPages(`/farms/${farmId}/lots`, lotSchema, { materialId }),
}
