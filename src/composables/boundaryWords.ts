import type { BoundaryVersion } from '../../shared/contract/blockChanges.ts'
import { formatDay } from '../../shared/messages/formatDay.ts'
import { translate, type Language } from '../../shared/messages/translate.ts'
import { formatNumber } from '../../shared/units/formatQuantity.ts'
import { hectaresText } from './blockWords.ts'

/** One version of an outline in words. */
export interface BoundaryLine {
  version: number
  day: string
  area: string
  note: string | null
  by: string | null
  records: { id: string; number: string }[]
}

export function boundaryLine(language: Language, { version, drawnOn, areaM2, note, by, records }: BoundaryVersion): BoundaryLine {
  return {
    version, note, records,
    day: formatDay(language, drawnOn),
    area: translate(language, 'blocks.hectares', { figure: hectaresText(language, areaM2) }),
    by: by === null ? null : translate(language, 'growing.boundaries.by', { name: by }),
  }
}

/** How much larger the newer outline is, "+120 m² (+1.29 %)"; a sign stands before every figure but nothing. */
export function areaDifference(language: Language, older: Pick<BoundaryVersion, 'areaM2'>, newer: Pick<BoundaryVersion, 'areaM2'>): string {
  const differenceM2 = newer.areaM2 - older.areaM2
  const signed = (value: number, digits: number): string => {
    const text = formatNumber(value, { digits }, language)
    return value > 0 && /[1-9]/.test(text) ? `+${text}` : text
  }
  return translate(language, 'growing.boundaries.differs', {
    area: translate(language, 'growing.boundaries.squareMetres', { figure: signed(differenceM2, 0) }),
    percent: signed((differenceM2 / older.areaM2) * 100, 2),
  })
}
