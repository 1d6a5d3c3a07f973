import { grantedSeasonsSchema, grantSchema, type Grant, type GrantedSeasons } from '../../shared/contract/grant.ts'
import { pageOf } from '../../shared/contract/common.ts'
import { registerRowSchema } from '../../shared/contract/record.ts'
import { registerTotalsSchema, type RegisterFilter, type RegisterTotals } from '../../shared/contract/register.ts'
import { allPages } from './allPages.ts'
import { http } from './http.ts'
import type { RegisterPage, RegisterQuery } from './recordApi.ts'

/** Grants of a farm, and those of the caller over all farms. */
export const grantApi = {
  list: (farmId: string): Promise<Grant[]> => allPages(`/farms/${farmId}/grants`, grantSchema),
  /** The register as the certifier of a grant is answered. */
  seenRecords: (farmId: string, id: string, query: RegisterQuery, cursor?: string): Promise<RegisterPage> =>
    http.get(`/farms/${farmId}/grants/${id}/records`, pageOf(registerRowSchema), { ...query, cursor }),
  seenTotals: (farmId: string, id: string, filter: RegisterFilter): Promise<RegisterTotals> =>
    http.get(`/farms/${farmId}/grants/${id}/totals`, registerTotalsSchema, { ...filter }),
  mine: (): Promise<GrantedSeasons> => http.get('/my-farms', grantedSeasonsSchema),
}
