import type { Certificate } from '../../shared/contract/certificate.ts'
import type { RegisterRow } from '../../shared/contract/record.ts'
import type { RegisterFilter, RegisterSort, RegisterTotals } from '../../shared/contract/register.ts'
import type { Language } from '../../shared/messages/translate.ts'

/** A record as the printed register shows it; the digest is that of its newest signed version. */
export type PrintedRow = Omit<RegisterRow, 'id'> & { digest: string | null }

/** All that a volume of the printed register shows: plain data, no clock, no database. */
export interface RegisterReportData {
  farm: { name: string; zone: string }
  language: Language
  volume: number
  volumes: number
  filter: RegisterFilter
  /** What the ids of the filter are called; null where the reader may not know. */
  names: { block: string | null; material: string | null; person: string | null }
  sort: RegisterSort
  totals: RegisterTotals
  rows: readonly PrintedRow[]
  /** All that are written down at the time of printing; what was in force on the days of the work is read off them. */
  certificates: readonly Certificate[]
  /** RFC 3339 instant. */
  printedAt: string
  /** The address of the check page as a person types it. */
  checkPage: string
}
