import { stringify } from 'csv-stringify'
import { pipeline, Readable, type Transform } from 'node:stream'
import type { Language } from '../../../shared/messages/translate.ts'
import type { FarmActor } from '../../database/actor.ts'
import type { Services } from '../services.ts'
import { CSV_COLUMNS, csvHead, csvLines, type CsvRecord } from './csvLines.ts'
import type { RegisterPlaceQuery } from './listRegister.ts'
import { readRegisterRows } from './readRegisterRows.ts'

const COLUMNS = 'd.state, d.register_row, d.content, d.computed, d.digest'

/**
 * The register as CSV (RFC 4180, UTF-8 with its mark, CRLF), streamed. One line is one block of one record, which is what a certifier asks
 * by: what was on this block, when, how much. Area and mix are the block's share and come to those of the record; words and rates of
 * the whole record stand on each of its lines, under heads that say so. Figures are those of the record, with a point and without grouping in every language, to
 * four decimals; instants carry the farm's offset. A cell that a spreadsheet would take for a formula begins with an apostrophe.
 * @param mayGoOn asked before each page of records is read, and breaks the table off by throwing.
 */
export function registerCsv(services: Services, actor: FarmActor, place: RegisterPlaceQuery, language: Language, mayGoOn?: () => Promise<void>): Transform {
  const table = stringify({
    bom: true, record_delimiter: '\r\n', header: true, escape_formulas: true,
    columns: CSV_COLUMNS.map((key) => ({ key, header: csvHead(key, language) })),
  })
  // What breaks one end off, ends the other with it.
  pipeline(Readable.from(lines(services, actor, place, { language, mayGoOn })), table, () => undefined)
  return table
}

async function* lines(
  services: Services, actor: FarmActor, place: RegisterPlaceQuery, { language, mayGoOn }: { language: Language; mayGoOn: (() => Promise<void>) | undefined },
): AsyncGenerator<Record<string, string>> {
  for await (const row of readRegisterRows<CsvRecord>(services, actor, place, { columns: COLUMNS, mayGoOn })) {
    yield* csvLines(row, { language, zone: actor.zone })
  }
}
