import type { BoundaryVersion } from '../../../shared/contract/blockChanges.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { figureFor, unitFor, type Reader } from '../../../shared/messages/readFigure.ts'
import { translate } from '../../../shared/messages/translate.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import { areaWords } from './blockWords.ts'

/** One version of an outline in words. */
export interface BoundaryLine {
  version: number
  day: string
  area: string
  note: string | null
  by: string | null
  records: { id: string; number: string }[]
}

export function boundaryLine(reader: Reader, { version, drawnOn, areaM2, note, by, records }: BoundaryVersion): BoundaryLine {
  const { language } = reader
  return {
    version, note, records,
    day: formatDay(language, drawnOn),
    area: areaWords(reader, areaM2),
    by: by === null ? null : translate(language, 'growing.boundaries.by', { name: by }),
  }
}

/** How much larger the newer outline is, "+120 m² (+1.29 %)"; a sign stands before every figure but nothing. */
export function areaDifference(reader: Reader, older: Pick<BoundaryVersion, 'areaM2'>, newer: Pick<BoundaryVersion, 'areaM2'>): string {
  const { language } = reader
  const differenceM2 = newer.areaM2 - older.areaM2
  const signed = (text: string): string => (differenceM2 > 0 && /[1-9]/.test(text) ? `+${text}` : text)
  return translate(language, 'growing.boundaries.differs', {
    area: `${signed(figureFor(reader, differenceM2, 'm2', { digits: 0 }))}\u00A0${unitFor(reader, 'm2')}`,
    percent: signed(formatNumber((differenceM2 / older.areaM2) * 100, { digits: 2 }, language)),
  })
}
