import type { z } from 'zod'
import { pageOf } from '../../shared/contract/common.ts'
import { journalEntrySchema, type JournalFilter } from '../../shared/contract/journal.ts'
import { http } from './http.ts'

const pageSchema = pageOf(journalEntrySchema)
const LIMIT = 50

/** The farm's journal, page by page. */
export const journalApi = {
  page: (farmId: string, filter: JournalFilter, cursor: string | undefined): Promise<z.output<typeof pageSchema>> =>
    http.get(`/farms/${farmId}/journal`, pageSchema, { ...filter, limit: LIMIT, cursor }),
}
