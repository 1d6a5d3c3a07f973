import { formatCheckCode } from '../../../shared/evidence/checkCode.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'
import { presentEach } from '../../../shared/register/presentEach.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { formatNumber, formatRate, formatVolumeL } from '../../../shared/units/formatQuantity.ts'
import type { PrintedRow } from '../registerReportData.ts'

export interface PrintPlace { language: Language; zone: string }

/** Columns of the printed register, widths in points; together they are as wide as a lying page. */
export const REGISTER_COLUMNS = [
  { name: 'record', width: 62, isBold: true },
  { name: 'when', width: 84 },
  { name: 'blocks', width: 76, isBold: true },
  { name: 'preparations', width: 124, hasMark: true },
  { name: 'lots', width: 64 },
  { name: 'areaHa', width: 40, isFigure: true, opensAccount: true },
  { name: 'totals', width: 56, isFigure: true },
  { name: 'rate', width: 58, isFigure: true },
  { name: 'by', width: 60, opensAccount: true },
  { name: 'checks', width: 62 },
  { name: 'code', width: 70.8 },
] as const
/** White between the mark of the method and the words. */
export const MARK_ROOM = 12

/** Rates from here up are read without decimals. */
const WHOLE_FROM = 100

/** The words of a row, column by column. */
export function registerCells(row: PrintedRow, { language, zone }: PrintPlace): string[] {
  const say = (id: string, params: Record<string, string | number> = {}) => translate(language, `registerPrint.pdf.${id}`, params)
  const nothing = say('nothing')
  const number = row.number ?? say('unsigned')
  return [
    row.version > 1 ? `${number}\n${say('version', { version: row.version })}` : number,
    row.startedAt === null ? nothing : `${formatDay(language, civilDateIn(zone, row.startedAt)).replaceAll(' ', '\u00a0')}, ${civilTimeIn(zone, row.startedAt)}`,
    row.blocks.map(({ code }) => code).join(', ') || nothing,
    row.preparations.join(', ') || nothing,
    row.lots.join(', ') || nothing,
    formatNumber(row.areaHa, { digits: Number(row.areaHa) < 0.1 ? 4 : 2 }, language),
    [row.totalL === null ? '' : `${formatVolumeL(row.totalL, language)}\u00a0L`, row.totalKg === null ? '' : `${formatNumber(row.totalKg, { digits: 1 }, language)}\u00a0kg`].filter((text) => text !== '').join('\n') || nothing,
    [row.sprayPerEach ? presentEach({ language, units: 'metric' }, row.sprayPerEach) : '', rate(row.sprayLPerHa, 'L', language), rate(row.kgPerHa, 'kg', language)].filter((text) => text !== '').join('\n') || nothing,
    row.lateHours === null ? row.by : say('late24', { name: row.by, hours: row.lateHours }),
    checkWords(row, say),
    row.digest === null ? '' : formatCheckCode(row.digest),
  ]
}

function rate(value: string | null, unit: string, language: Language): string {
  if (value === null) return ''
  const text = Number(value) >= WHOLE_FROM ? formatNumber(value, { digits: 0 }, language) : formatRate(value, language, 3)
  return `${text}\u00a0${unit}`
}

function checkWords({ state, tally }: PrintedRow, say: (id: string, params?: Record<string, string | number>) => string): string {
  if (state === 'withdrawn') return say('withdrawn')
  if (state !== 'signed') return say('unsigned')
  const found = tally.stop === 1 ? say('stop')
    : tally.stop > 1 ? say('stops', { stops: tally.stop })
    : tally.caution > 0 ? say('caution', { cautions: tally.caution })
    : say('noStop')
  return tally.unknown === 0 ? found : say('unknown', { found, unknown: tally.unknown })
}
