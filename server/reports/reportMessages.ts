import type { ReportJob } from './renderReport.ts'

/** What the server tells the drawing process. */
export interface WorkerOrder { id: number; job: ReportJob }

/** What the drawing process answers, in this order for each job: chunks, then done or failed. */
export type WorkerAnswer =
  | { kind: 'ready' }
  | { kind: 'chunk'; id: number; bytes: Uint8Array }
  | { kind: 'done'; id: number }
  | { kind: 'failed'; id: number; message: string }
