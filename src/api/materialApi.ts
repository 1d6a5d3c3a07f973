import { materialSchema, type Material } from '../../shared/contract/input.ts'
import { allPages } from './allPages.ts'

/** The materials of a farm. */
export const materialApi = {
  list: (farmId: string): Promise<Material[]> => allPages(`/farms/${farmId}/materials`, materialSchema),
}
