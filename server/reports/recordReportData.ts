import type { Certificate } from '../../shared/contract/certificate.ts'
import type { SignedRecord } from '../../shared/contract/signedRecord.ts'
import type { Boundary } from '../../shared/geo/geometryTypes.ts'
import type { Language } from '../../shared/messages/translate.ts'
import type { GroundPiece, PlanSite } from './parts/planTypes.ts'

/** All that the PDF of a record shows: plain data, no clock, no database. */
export interface RecordReportData {
  signed: SignedRecord
  /** SHA-256 of the signed text, hex. */
  digest: string
  /** What the signer was asked for. */
  signedWith: 'password' | 'pin'
  names: { doneBy: string; enteredBy: string; signedBy: string }
  /** Reviews of this version, oldest first; a name that was blanked is empty. */
  reviews: readonly { by: string; at: string; note: string | null }[]
  /** The record's newest version; another than the one printed where an older one is asked for. */
  newest: { version: number; digest: string }
  neighbours: readonly { code: string; geometry: Boundary }[]
  /** Ground plan and sites as they stood on the day of the work, for orientation. */
  ground: readonly GroundPiece[]
  sites: readonly PlanSite[]
  state: 'signed' | 'withdrawn'
  /** All that are written down at the time of printing; what was in force on the days of the work is read off them. */
  certificates: readonly Certificate[]
  /** RFC 3339 instant. */
  printedAt: string
  /** Where the QR code leads. */
  checkUrl: string
  /** The address of the check page as a person types it. */
  checkPage: string
  /** Who runs the server: the farm itself, or a name. */
  runBy: string
  language: Language
}
