import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { extraDigits, type ColumnFigure } from '../../../shared/units/extraDigits.ts'
import { roundDecimal } from '../../../shared/units/roundDecimal.ts'
import type { UnitCode } from '../../../shared/units/unitTable.ts'
import type { Column } from '../parts/ledgerTable.ts'
import type { Span } from '../parts/wrapText.ts'
import type { RecordFigures } from './recordFigures.ts'
import { plain, type ReportWords } from './reportWords.ts'

type Loads = SignedRecord['computed']['loads']
interface LoadShares { perFullLoad: string | null; perLastLoad: string | null }

/** The figures of the mix as they are printed: each column with enough decimals that it comes to its total. */
export interface MixColumns {
  count: number
  addsUp: boolean
  heads(width: number): Column[]
  inAll(value: string | null, unit: string): string
  perHa(litres: string | null): string
  /** Cells of the full and the last load; none where the mix is in no tank. */
  loadCells(shares: LoadShares | null, unit?: string): Span[][]
  loadTotals(loads: Loads): string[]
  /** Litres of the last load. */
  lastLoad(lastL: string): string
}

interface Input { signed: SignedRecord; figures: RecordFigures; words: ReportWords }

export function mixColumns({ signed, figures: { sheet, agrees }, words }: Input): MixColumns {
  const { say } = words
  const { computed } = signed
  const { loads } = computed
  const none = say('lines.none')
  const liquids = [
    ...(hasWater(signed) ? [{ ...sheet.water, unit: 'L' as const, inAll: computed.waterL }] : []),
    ...sheet.components.flatMap(({ amount, inL, ...shares }) => (amount && inL !== null ? [{ ...shares, unit: amount.unit, inAll: amount.value }] : [])),
  ]
  const weighed = sheet.components.flatMap(({ amount, inKg }) => (amount && inKg !== null ? [amount] : []))
  const fit = (figures: readonly (ColumnFigure | null)[], total: string | null): number | null => {
    if (!agrees || total === null || figures.includes(null)) return 0
    return extraDigits(figures.filter((figure) => figure !== null), { value: total, digits: words.digits(total) })
  }
  const column = (read: (liquid: (typeof liquids)[number]) => string | null) => liquids.map((liquid) => figureIn('L', read(liquid), liquid.unit, words))
  const extra = {
    inAll: fit(column(({ inAll }) => inAll), computed.totalL),
    inKg: fit(weighed.map(({ value, unit }) => figureIn('kg', value, unit, words)), computed.totalKg),
    perHa: fit(liquids.map(({ perHa }) => figureIn('L', perHa, 'L', words)), computed.sprayLPerHa),
    full: fit(column(({ perFullLoad }) => perFullLoad), loads && loads.full > 0 ? loads.tankL : null),
    last: fit(column(({ perLastLoad }) => perLastLoad), loads && Number(loads.lastL) > 0 ? loads.lastL : null),
  }
  const lastExtra = loads && computed.totalL !== null ? loadsExtra(loads, computed.totalL, words) : 0
  const cell = (value: string | null, more: number | null, unit?: string): string => {
    if (value === null) return none
    return unit === undefined ? words.amount(value, more ?? 0) : words.worked(value, unit)
  }
  return {
    count: loads ? 8 : 6,
    addsUp: ![...Object.values(extra), lastExtra].includes(null),
    heads: (width) => headsOf(say, { width, hasLoads: loads !== null }),
    inAll: (value, unit) => (value === null ? none : words.worked(value, unit, (unit === 'L' ? extra.inAll : unit === 'kg' ? extra.inKg : 0) ?? 0)),
    perHa: (value) => cell(value, extra.perHa),
    loadCells: (of, unit) => (loads ? [plain(cell(of?.perFullLoad ?? null, extra.full, unit)), plain(cell(of?.perLastLoad ?? null, extra.last, unit))] : []),
    loadTotals: (of) => (of ? [of.full > 0 ? words.amount(of.tankL) : none, Number(of.lastL) > 0 ? words.amount(of.lastL, lastExtra ?? 0) : none] : []),
    lastLoad: (lastL) => words.amount(lastL, lastExtra ?? 0),
  }
}

/** A figure as its column adds it up: in another unit than the column's it counts as it is printed there. */
function figureIn(columnUnit: UnitCode, value: string | null, unit: UnitCode, words: ReportWords): ColumnFigure | null {
  if (value === null) return null
  const digits = words.digits(value)
  return unit === columnUnit ? { value, digits } : { value: convertQuantity({ value: roundDecimal(value, digits), unit }, columnUnit), digits: null }
}

/** Decimals that the last load needs so that the full loads and it come to the total. */
function loadsExtra({ full, tankL, lastL }: NonNullable<Loads>, totalL: string, words: ReportWords): number | null {
  const fullLoads = Array.from({ length: full }, (): ColumnFigure => ({ value: tankL, digits: null }))
  return extraDigits([...fullLoads, { value: lastL, digits: words.digits(lastL) }], { value: totalL, digits: words.digits(totalL) })
}

function hasWater({ computed: { waterL } }: SignedRecord): boolean {
  return waterL !== null && Number(waterL) > 0
}

function headsOf(say: ReportWords['say'], { width, hasLoads }: { width: number; hasLoads: boolean }): Column[] {
  const fixed: Column[] = [
    { head: say('mix.lot'), width: hasLoads ? 70 : 100 },
    { head: say('mix.measure'), width: hasLoads ? 78 : 100 },
    { head: say('mix.known'), width: 59 },
    { head: say('mix.inAll'), width: 62, align: 'right', opensAccount: true },
    { head: say('mix.perHa'), width: hasLoads ? 47 : 64, align: 'right' },
    ...(hasLoads ? [
      { head: say('mix.fullLoad'), width: 51, align: 'right' as const },
      { head: say('mix.lastLoad'), width: 47, align: 'right' as const },
    ] : []),
  ]
  return [{ head: say('mix.ingredient'), width: width - fixed.reduce((sum, column) => sum + column.width, 0) }, ...fixed]
}
