import type { RegisterRow } from '../contract/record.ts'
import { formatDayShort } from '../messages/formatDayShort.ts'
import { figureFor, figureIn, quantityFor, unitFor, type Reader } from '../messages/readFigure.ts'
import { civilDateIn, civilTimeIn } from '../time/civilDate.ts'
import { formatNumber } from '../units/formatQuantity.ts'
import type { UnitCode } from '../units/unitTable.ts'
import { presentBlocks } from './presentBlocks.ts'
import { presentEach } from './presentEach.ts'
import type { RegisterLine } from './registerLine.ts'

export interface RegisterPlace extends Reader {
  /** IANA zone of the farm. */
  zone: string
  /** Season whose numbers are printed without their year. */
  season: number
}

/** Rates from here up are read without decimals. */
const WHOLE_FROM = 100

/** A row of the register in words: times in the farm's zone, figures rounded for display. */
export function presentRow(row: RegisterRow, place: RegisterPlace): RegisterLine {
  const { language, zone, season } = place
  const at = row.startedAt
  return {
    id: row.id,
    state: row.state,
    number: row.number === null ? null : row.season === season ? shortNumber(row.number) : row.number,
    fullNumber: row.number,
    onDevice: false,
    version: row.version,
    method: row.method,
    ...presentBlocks(row.blocks),
    preparation: row.preparations.join(', '),
    lots: row.lots.join(', '),
    day: at === null ? '' : formatDayShort(language, civilDateIn(zone, at)),
    start: at === null ? '' : civilTimeIn(zone, at),
    area: figureFor(place, row.areaHa, 'ha', { digits: 2 }),
    areaText: quantityFor(place, row.areaHa, 'ha', { digits: 2 }),
    ...presentVolume(place, row.totalL),
    mass: row.totalKg === null ? '' : quantityFor(place, row.totalKg, 'kg', { digits: 1 }),
    rate: row.sprayPerEach ? presentEach(place, row.sprayPerEach) : presentRate(place, row.sprayLPerHa, 'L/ha') || presentRate(place, row.kgPerHa, 'kg/ha'),
    by: row.by,
    lateHours: row.lateHours,
    tally: row.tally,
  }
}

/** What was put on by volume, in words; empty where there is none. @param totalL litres. */
export function presentVolume(reader: Reader, totalL: string | number | null): Pick<RegisterLine, 'volume' | 'volumeText'> {
  if (totalL === null) return { volume: '', volumeText: '' }
  return { volume: figureFor(reader, totalL, 'L', { digits: 1 }), volumeText: quantityFor(reader, totalL, 'L', { digits: 1 }) }
}

/** A rate with its unit, whole from 100 up, else three digits of it; empty where there is none. @param perHa litres or kilograms a hectare. */
export function presentRate(reader: Reader, perHa: string | number | null, unit: Extract<UnitCode, 'L/ha' | 'kg/ha'>): string {
  if (perHa === null) return ''
  const rate = figureIn(perHa, unit, reader.units)
  return `${formatNumber(rate, Number(rate) >= WHOLE_FROM ? { digits: 0 } : { significant: 3 }, reader.language)}\u00A0${unitFor(reader, unit)}`
}

/** "0143" of "2026-0143". */
function shortNumber(number: string): string {
  return number.slice(number.indexOf('-') + 1)
}
