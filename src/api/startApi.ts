import { startSchema, type Start } from '../../shared/contract/start.ts'
import { http } from './http.ts'

/** How far the first hour of a farm is. */
export const startApi = {
  read: (farmId: string): Promise<Start> => http.get(`/farms/${farmId}/start`, startSchema),
}
