import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { Table } from '../parts/ledgerTable.ts'
import { STYLES } from '../parts/styles.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

/** Names of what a file can be; another type stands as it is. */
const TYPES: Record<string, string> = { 'image/jpeg': 'JPEG', 'image/png': 'PNG', 'image/webp': 'WebP', 'application/pdf': 'PDF' }

/** Photos and papers that were with the record at its signature, each with the digest of its bytes. */
export function filesTable({ files }: SignedRecord, { words, place }: { words: ReportWords; place: { x: number; width: number } }): Table {
  const { say } = words
  const widths = { type: 40, size: 52, digest: 290 }
  const label = place.width - Object.values(widths).reduce((sum, width) => sum + width, 0)
  return {
    x: place.x, leading: STYLES.body.leading, padding: 2.4, showsHeads: true,
    columns: [
      { head: say('files.label'), width: label },
      { head: say('files.type'), width: widths.type },
      { head: say('files.size'), width: widths.size, align: 'right' },
      { head: say('files.digest'), width: widths.digest },
    ],
    rows: files.map((file) => ({
      hasHead: true,
      cells: [
        bold(file.label), plain(TYPES[file.type] ?? file.type), plain(sizeOf(file.bytes, words)),
        [{ text: file.digest, style: STYLES.note }],
      ],
    })),
  }
}

const KILO = 1000

/** A size in the largest unit of 1000 bytes each that leaves at least 1. */
function sizeOf(bytes: number, { say, short, tenths }: ReportWords): string {
  if (bytes < KILO) return say('files.bytes', { value: short(String(bytes)) })
  if (bytes < KILO * KILO) return say('files.kilobytes', { value: short(String(Math.round(bytes / KILO))) })
  return say('files.megabytes', { value: tenths(String(bytes / KILO / KILO)) })
}
