import { pageOf } from '../../shared/contract/common.ts'
import { recordSchema, registerRowSchema, type ApplicationRecord, type RegisterRow } from '../../shared/contract/record.ts'
import { http } from './http.ts'

/** Which rows of the register to read. */
export interface RegisterQuery {
  limit?: number
  block?: string
  state?: RegisterRow['state']
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
}
