import { holdsSchema, type Hold } from '../../shared/contract/hold.ts'
import { http } from './http.ts'

/** What labels in signed records hold. */
export const holdApi = {
  today: async (farmId: string): Promise<Hold[]> => (await http.get(`/farms/${farmId}/holds`, holdsSchema)).items,
  /** Of one block, on any day of the span. */
  ofBlock: async (farmId: string, blockId: string, span: { from: string; to: string }): Promise<Hold[]> => (await http.get(`/farms/${farmId}/blocks/${blockId}/holds`, holdsSchema, span)).items,
}
