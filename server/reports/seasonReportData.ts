import type { Certificate } from '../../shared/contract/certificate.ts'
import type { Boundary } from '../../shared/geo/geometryTypes.ts'
import type { Language } from '../../shared/messages/translate.ts'
import type { BlockSummary, SeasonFigures } from '../../shared/season/summaryTypes.ts'
import type { RecordReportData } from './recordReportData.ts'
import type { PrintedRow } from './registerReportData.ts'

/** A block of the summary as it stands now: its crop, its ground, its outline. */
export interface SummaryBlock extends BlockSummary {
  crop: string | null
  areaM2: string | null
  geometry: Boundary | null
}

interface SeasonPart {
  farm: { name: string; zone: string }
  language: Language
  season: number
  /** The season has not ended. */
  isRunning: boolean
  volume: number
  volumes: number
  /** The last entry of the season's log and the digest of all up to it; null while there is none. */
  head: { seq: number; digest: string } | null
  /** RFC 3339 instant. */
  printedAt: string
}

/** All that a volume of the season report shows: plain data, no clock, no database. */
export interface SeasonReportData extends SeasonPart {
  /** All that are written down at the time of printing; what was in force on the days of the work is read off them. */
  certificates: readonly Certificate[]
  /** First and last civil day of the season. */
  span: { from: string; to: string }
  figures: SeasonFigures
  /** For the first volume; the others have none. */
  blocks: readonly SummaryBlock[]
  rows: readonly PrintedRow[]
  /** The address of the check page as a person types it. */
  checkPage: string
  /** Where the QR code leads; null while the season has no entry. */
  checkUrl: string | null
}

/** A volume of the sheets of a season's records, one after the other. */
export interface SheetsReportData extends SeasonPart {
  records: readonly RecordReportData[]
}
