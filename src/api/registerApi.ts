import { registerTotalsSchema, registerVolumesSchema, type RegisterFilter, type RegisterSort, type RegisterTotals, type RegisterVolumes } from '../../shared/contract/register.ts'
import { savedFilterSchema, type SavedFilter } from '../../shared/contract/savedFilter.ts'
import { allPages } from './allPages.ts'
import { http } from './http.ts'

/** Sums of the register, what it goes out as, and the filters kept of it. */
export const registerApi = {
  totals: (farmId: string, filter: RegisterFilter): Promise<RegisterTotals> => http.get(`/farms/${farmId}/register/totals`, registerTotalsSchema, { ...filter }),
  volumes: (farmId: string, query: RegisterFilter & { sort: RegisterSort; language: string }): Promise<RegisterVolumes> =>
    http.get(`/farms/${farmId}/register/volumes`, registerVolumesSchema, { ...query }),
  filters: (farmId: string): Promise<SavedFilter[]> => allPages(`/farms/${farmId}/saved-filters`, savedFilterSchema),
}
