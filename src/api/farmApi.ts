import { farmSchema, type Farm } from '../../shared/contract/farm.ts'
import { http } from './http.ts'

/** A farm's own facts. */
export const farmApi = {
  read: (farmId: string): Promise<Farm> => http.get(`/farms/${farmId}`, farmSchema),
}
