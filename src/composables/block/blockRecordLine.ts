import type { RegisterRow } from '../../../shared/contract/record.ts'
import type { Method } from '../../../shared/contract/recordContent.ts'
import { formatDayShort } from '../../../shared/messages/formatDayShort.ts'
import { figureIn, unitFor, type Reader } from '../../../shared/messages/readFigure.ts'
import { translate } from '../../../shared/messages/translate.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'

/** A record among the last of its block, in words. */
export interface BlockRecordLine {
  id: string
  /** "0131" of 2026-0131; the state in a word where there is no number yet. */
  number: string
  fullNumber: string
  state: RegisterRow['state']
  day: string
  method: Method
  preparation: string
  rate: string | null
}

/** "510 L/ha": whole from 100 up, one decimal below. */
function rateText(reader: Reader, lPerHa: string): string {
  const rate = figureIn(lPerHa, 'L/ha', reader.units)
  return `${formatNumber(rate, { digits: Number(rate) >= 100 ? 0 : 1 }, reader.language)}\u00A0${unitFor(reader, 'L/ha')}`
}

/** One register row as a line of its block's page. @param zone the farm's time zone. */
export function blockRecordLine(reader: Reader, zone: string, row: RegisterRow): BlockRecordLine {
  const { language } = reader
  const started = row.startedAt === null ? '' : formatDayShort(language, civilDateIn(zone, row.startedAt))
  const word = translate(language, 'blocks.page.started')
  const fullNumber = row.number ?? word
  return {
    id: row.id,
    number: row.number?.slice(row.number.lastIndexOf('-') + 1) ?? word,
    fullNumber: row.state === 'withdrawn' ? `${fullNumber}, ${translate(language, 'blocks.page.withdrawn')}` : fullNumber,
    state: row.state,
    day: started,
    method: row.method,
    preparation: row.preparations.join(', '),
    rate: row.sprayLPerHa === null ? null : rateText(reader, row.sprayLPerHa),
  }
}
