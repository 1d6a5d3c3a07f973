import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { Table, TableRow } from '../parts/ledgerTable.ts'
import { STYLES } from '../parts/styles.ts'
import { measureWords, mixName, waterMeasure } from './mixWords.ts'
import { mixColumns, type MixColumns } from './mixColumns.ts'
import type { RecordFigures } from './recordFigures.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'
import { usedRow } from './usedRow.ts'

export interface MixInput { signed: SignedRecord; figures: RecordFigures; words: ReportWords; place: { x: number; width: number } }

export interface MixTable {
  table: Table
  /** False where the rounded figures of a column do not come to the total that is printed. */
  addsUp: boolean
}

/** The table of what the mix holds: water, each ingredient with its lot and what was used of it, and all of it. */
export function mixTable({ signed, figures, words, place }: MixInput): MixTable {
  const context: Context = { signed, figures, words, columns: mixColumns({ signed, figures, words }) }
  const rows: TableRow[] = [
    ...(signed.computed.waterL === null || Number(signed.computed.waterL) === 0 ? [] : [waterRow(context)]),
    ...signed.content.components.flatMap((_component, index) => componentRows(context, index)),
    ...totalRows(context),
  ]
  const last = rows.at(-2)
  if (last) last.keepsWithNext = true
  return {
    addsUp: context.columns.addsUp,
    table: { x: place.x, columns: context.columns.heads(place.width), rows, leading: STYLES.body.leading, padding: 2.4, showsHeads: true },
  }
}

interface Context { signed: SignedRecord; figures: RecordFigures; words: ReportWords; columns: MixColumns }

function waterRow({ signed, figures, words, columns }: Context): TableRow {
  const { say } = words
  const { water } = signed.content
  const { sheet, agrees } = figures
  const isTyped = water?.sizedFrom === 'water'
  return {
    hasHead: true,
    cells: [
      plain(say('mix.water')),
      plain(water !== null && water.sizedFrom !== 'none' && water.source !== null ? water.source : say('lines.none')),
      plain(waterMeasure(signed, words)),
      plain(say(isTyped ? 'known.typed' : 'known.workedOut')),
      bold(columns.inAll(signed.computed.waterL, 'L')),
      plain(columns.perHa(agrees ? sheet.water.perHa : null)),
      ...columns.loadCells(agrees ? sheet.water : null),
    ],
  }
}

function componentRows({ signed, figures, words, columns }: Context, index: number): TableRow[] {
  const { say } = words
  const component = signed.content.components[index]
  const material = signed.materials.find(({ id }) => id === component?.materialId)
  const lot = signed.lots.find(({ id }) => id === component?.lotId)
  if (!component || !material) throw new RangeError(`the record does not hold the material of component ${index}`)
  const worked = figures.agrees ? (figures.sheet.components[index] ?? null) : null
  const amount = signed.computed.components[index]?.amount
  const inAll = amount ? columns.inAll(amount.value, amount.unit) : say('lines.none')
  const row: TableRow = {
    hasHead: true,
    cells: [
      plain(material.name),
      plain(lot ? say('mix.lotCode', { code: lot.code }) : say('mix.noLot')),
      plain(measureWords(component.basis, words)),
      plain(say('known.workedOut')),
      component.used === null ? bold(inAll) : plain(inAll),
      plain(worked?.inKg == null ? columns.perHa(worked?.perHa ?? null) : words.worked(worked.perHa ?? '0', 'kg')),
      ...columns.loadCells(worked, amount?.unit === 'L' ? undefined : amount?.unit),
    ],
  }
  if (component.used === null || !amount) return [row]
  return [{ ...row, keepsWithNext: true }, usedRow({ used: component.used, planned: amount, columns: columns.count }, words)]
}

/** All of the mix by volume, and what is weighed where nothing else says its sum. */
function totalRows({ signed, words, columns }: Context): TableRow[] {
  const { totalL, totalKg, sprayLPerHa, kgPerHa, loads, components } = signed.computed
  const weighed = components.filter(({ amount }) => ['kg', 'g', 'lb', 'oz'].includes(amount.unit)).length
  const row = (name: string, cells: string[]): TableRow => ({
    isTotal: true, hasHead: true, runsOver: { column: 0, columns: 4 },
    cells: [bold(name), [], [], [], ...cells.map((cell) => bold(cell))],
  })
  const rows: TableRow[] = []
  if (totalL !== null) {
    const perHa = sprayLPerHa === null ? words.say('lines.none') : words.amount(sprayLPerHa)
    rows.push(row(mixName(signed, words, columns.lastLoad), [words.worked(totalL, 'L'), perHa, ...columns.loadTotals(loads)]))
  }
  if (totalKg !== null && (totalL === null || weighed > 1)) {
    const perHa = kgPerHa === null ? words.say('lines.none') : words.worked(kgPerHa, 'kg')
    rows.push(row(words.say('mix.weighed'), [words.worked(totalKg, 'kg'), perHa, ...(loads ? ['', ''] : [])]))
  }
  return rows
}
