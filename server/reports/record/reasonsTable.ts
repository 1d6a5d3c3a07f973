import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import type { Table } from '../parts/ledgerTable.ts'
import { STYLES } from '../parts/styles.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

/** What is acknowledged under a name of its own and not under a check's. */
const NAMED: Record<string, string> = { 'record.stop': 'reasons.stop', 'record.late': 'reasons.late' }

/** What spoke against signing, each with the reason given. */
export function reasonsTable(
  { acknowledged, checks }: SignedRecord, { words, place }: { words: ReportWords; place: { x: number; width: number } },
): Table {
  const { say, language } = words
  const nameOf = (code: string): string => {
    const check = checks.find((candidate) => candidate.code === code)
    if (check) return renderMessage(language, check.title)
    const id = NAMED[code]
    return id === undefined ? code : say(id)
  }
  return {
    x: place.x, leading: STYLES.body.leading, padding: 2.4, showsHeads: true,
    columns: [{ head: say('reasons.what'), width: 150 }, { head: say('reasons.why'), width: place.width - 150 }],
    rows: acknowledged.map(({ code, reason }) => ({ hasHead: true, cells: [bold(nameOf(code)), plain(reason)] })),
  }
}
