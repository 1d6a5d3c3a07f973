import { stringify } from 'csv-stringify'
import { pipeline, Readable, type Transform } from 'node:stream'
import type { JournalEntry, JournalFilter } from '../../../shared/contract/journal.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'
import { isoInZone } from '../../../shared/time/isoInZone.ts'
import type { FarmActor } from '../../database/actor.ts'
import type { Services } from '../services.ts'
import { readJournalPage } from './listJournal.ts'
import { actionWords, factWords } from './entryWords.ts'

const PAGE = 200
const COLUMNS = ['at', 'by', 'action', 'subject', 'facts', 'network', 'device'] as const

/** The journal of a filter as CSV, the newest deed first; a cell that a spreadsheet would take for a formula begins with an apostrophe. */
export function journalCsv(services: Services, actor: FarmActor, filter: JournalFilter, language: Language): Transform {
  const table = stringify({
    bom: true, record_delimiter: '\r\n', header: true, escape_formulas: true,
    columns: COLUMNS.map((key) => ({ key, header: translate(language, `journal.column.${key}`) })),
  })
  pipeline(Readable.from(lines(services, actor, filter, language)), table, () => undefined)
  return table
}

async function* lines(services: Services, actor: FarmActor, filter: JournalFilter, language: Language): AsyncGenerator<Record<string, string>> {
  let cursor: string | undefined
  do {
    const page = await services.database.inFarm(actor, (manager) => readJournalPage(manager, actor, filter, { limit: PAGE, cursor }))
    for (const entry of page.items) yield line(entry, actor, language)
    cursor = page.next ?? undefined
  } while (cursor !== undefined)
}

function line(entry: JournalEntry, { zone }: FarmActor, language: Language): Record<(typeof COLUMNS)[number], string> {
  return {
    at: isoInZone(zone, entry.at),
    by: entry.by?.name ?? '',
    action: actionWords(language, entry.action),
    subject: entry.subject ?? '',
    facts: entry.facts.map((fact) => factWords(language, fact)).join('; '),
    network: entry.from.network ?? '',
    device: entry.from.device ?? '',
  }
}
