import { pageOf } from '../../shared/contract/common.ts'
import { recordSchema, registerRowSchema, type ApplicationRecord, type RegisterRow } from '../../shared/contract/record.ts'
import type { RegisterFilter, RegisterSort } from '../../shared/contract/register.ts'
import { recordVersionsSchema, type RecordVersions } from '../../shared/contract/recordVersions.ts'
import { http } from './http.ts'

/** Which rows of the register to read, in which order. */
export interface RegisterQuery extends RegisterFilter {
  limit?: number
  sort?: RegisterSort
}

export interface RegisterPage {
  items: RegisterRow[]
  next: string | null
}

/** Records and the register; writes go through submit(command). */
export const recordApi = {
  page: (farmId: string, query: RegisterQuery = {}, cursor?: string): Promise<RegisterPage> =>
    http.get(`/farms/${farmId}/records`, pageOf(registerRowSchema), { ...query, cursor }),
  read: (farmId: string, id: string): Promise<ApplicationRecord> =>
    http.get(`/farms/${farmId}/records/${id}`, recordSchema),
  versions: (farmId: string, id: string): Promise<RecordVersions> =>
    http.get(`/farms/${farmId}/records/${id}/versions`, recordVersionsSchema),
}
