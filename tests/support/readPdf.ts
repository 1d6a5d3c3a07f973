import { execFileSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Writable } from 'node:stream'
import { renderReport, type ReportJob } from '../../server/reports/renderReport.ts'
import type { RecordReportData } from '../../server/reports/recordReportData.ts'

/** What independent readers say of a PDF. */
export interface ReadPdf {
  /** What `qpdf --check` says; the tool ends with an error if it is not clean. */
  check: string
  /** `pdfinfo` by its names. */
  info: Record<string, string>
  /** One line of `pdffonts` a font. */
  fonts: string[]
  text: string
  /** Text of each page. */
  pages: string[]
  /** What stands for each figure where it is not seen. */
  alts: string[]
  /** Elements of the structure, as `pdfinfo -struct-text` lists them. */
  structure: string
  /** All of the file unpacked, so that its operators can be read. */
  plain: string
}

/** The bytes of a record's PDF, drawn in this process. */
export const drawRecord = (data: RecordReportData): Promise<Buffer> => drawReport({ kind: 'record', data })

/** The bytes of any document, drawn in this process. */
export async function drawReport(job: ReportJob): Promise<Buffer> {
  const chunks: Buffer[] = []
  await renderReport(job, new Writable({
    write(chunk: Buffer, _encoding, done) {
      chunks.push(chunk)
      done()
    },
  }))
  return Buffer.concat(chunks)
}

/** The text of a PDF, white space folded, as poppler reads it. */
export function readText(bytes: Buffer): string {
  return execFileSync('pdftotext', ['-raw', '-', '-'], { input: bytes, encoding: 'utf8' }).replace(/\s+/g, ' ')
}

/** Reads a PDF with qpdf and poppler. */
export function readPdf(bytes: Buffer): ReadPdf {
  const folder = mkdtempSync(join(tmpdir(), 'pdf-'))
  const file = join(folder, 'file.pdf')
  const run = (tool: string, ...args: string[]): string => execFileSync(tool, args, { encoding: 'utf8', maxBuffer: 1 << 28 })
  try {
    writeFileSync(file, bytes)
    execFileSync('qpdf', ['--qdf', '--object-streams=disable', file, join(folder, 'plain.pdf')])
    const text = run('pdftotext', '-raw', file, '-')
    return {
      check: run('qpdf', '--check', file),
      info: Object.fromEntries(run('pdfinfo', file).split('\n').map((line) => {
        const [name = '', ...rest] = line.split(':')
        return [name, rest.join(':').trim()]
      })),
      fonts: run('pdffonts', file).trim().split('\n').slice(2),
      text,
      pages: text.split('\f').slice(0, -1),
      alts: altsOf(JSON.parse(run('qpdf', '--json=2', '--json-key=qpdf', '--json-stream-data=none', file))),
      structure: run('pdfinfo', '-struct-text', file),
      plain: readFileSync(join(folder, 'plain.pdf'), 'latin1'),
    }
  } finally {
    rmSync(folder, { recursive: true })
  }
}

/** Operators of the pages' content, one a line. */
export function contentOf({ plain }: ReadPdf): string[] {
  return [...plain.matchAll(/\nstream\n([\s\S]*?)\nendstream/g)]
    .map(([, stream = '']) => stream)
    .filter((stream) => / B[DM]C$/m.test(stream))
    .flatMap((stream) => stream.split('\n'))
}

/** Alt texts anywhere in the objects that qpdf lists; it writes text strings as "u:" and the words. */
function altsOf(value: unknown): string[] {
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([key, inner]: [string, unknown]) =>
    key === '/Alt' && typeof inner === 'string' ? [inner.replace(/^u:/, '')] : altsOf(inner))
}
