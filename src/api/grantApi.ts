import { grantedSeasonsSchema, grantSchema, type Grant, type GrantedSeason } from '../../shared/contract/grant.ts'
import { allPages } from './allPages.ts'
import { http } from './http.ts'

/** Grants of a farm, and those of the caller over all farms. */
export const grantApi = {
  list: (farmId: string): Promise<Grant[]> => allPages(`/farms/${farmId}/grants`, grantSchema),
  mine: async (): Promise<GrantedSeason[]> => (await http.get('/my-farms', grantedSeasonsSchema)).items,
}
