import { blockSchema, type Block } from '../../shared/contract/block.ts'
import { boundaryVersionsSchema, type BoundaryVersion } from '../../shared/contract/blockChanges.ts'
import { allPages } from './allPages.ts'
import { http } from './http.ts'

/** The blocks of a farm; writes go through submit(command). */
export const blockApi = {
  list: (farmId: string): Promise<Block[]> => allPages(`/farms/${farmId}/blocks`, blockSchema),
  /** Those that have ended along with them. */
  listAll: (farmId: string): Promise<Block[]> => allPages(`/farms/${farmId}/blocks`, blockSchema, { ended: 'true' }),
  read: (farmId: string, id: string): Promise<Block> => http.get(`/farms/${farmId}/blocks/${id}`, blockSchema),
  boundaries: async (farmId: string, id: string): Promise<BoundaryVersion[]> => (await http.get(`/farms/${farmId}/blocks/${id}/boundaries`, boundaryVersionsSchema)).items,
}
