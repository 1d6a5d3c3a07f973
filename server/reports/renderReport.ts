import type { Writable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import '../../shared/messages/everyLanguage.ts'
import { blankRecordReport, type BlankRecordData } from './blankRecordReport.ts'
import { farmMapReport } from './farmMapReport.ts'
import type { FarmMapData } from './farmMapReportData.ts'
import { gatherChunks } from './parts/gatherChunks.ts'
import { recordReport } from './recordReport.ts'
import type { RecordReportData } from './recordReportData.ts'
import { registerReport } from './registerReport.ts'
import type { RegisterReportData } from './registerReportData.ts'
import { seasonReport } from './seasonReport.ts'
import type { SeasonReportData, SheetsReportData } from './seasonReportData.ts'
import { sheetsReport } from './sheetsReport.ts'

/** Everything the server can print; a new document is a new kind. */
export type ReportJob =
  | { kind: 'record'; data: RecordReportData }
  | { kind: 'register'; data: RegisterReportData }
  | { kind: 'season'; data: SeasonReportData }
  | { kind: 'sheets'; data: SheetsReportData }
  | { kind: 'farmMap'; data: FarmMapData }
  | { kind: 'blankRecord'; data: BlankRecordData }

/**
 * Draws a document into a stream; resolves when the stream has taken all of it.
 * @throws what the drawing or the stream throws; the stream is then destroyed.
 */
export async function renderReport(job: ReportJob, stream: Writable): Promise<void> {
  const chunks = gatherChunks()
  const taken = pipeline(chunks, stream)
  try {
    if (job.kind === 'record') recordReport(job.data, chunks)
    else if (job.kind === 'register') registerReport(job.data, chunks)
    else if (job.kind === 'season') seasonReport(job.data, chunks)
    else if (job.kind === 'sheets') sheetsReport(job.data, chunks)
    else if (job.kind === 'farmMap') farmMapReport(job.data, chunks)
    else blankRecordReport(job.data, chunks)
  } catch (error) {
    chunks.destroy(error instanceof Error ? error : new Error(String(error)))
  }
  await taken
}
