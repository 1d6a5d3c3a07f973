import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { Basis } from '../../../shared/contract/recordContent.ts'
import type { Column, Table, TableRow } from '../parts/ledgerTable.ts'
import { STYLES } from '../parts/styles.ts'
import type { RecordFigures } from './recordFigures.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

interface MixInput { signed: SignedRecord; figures: RecordFigures; words: ReportWords; place: { x: number; width: number } }

/** The table of what the mix holds: water, each ingredient with its lot, and the spray in all. */
export function mixTable({ signed, figures, words, place }: MixInput): Table {
  const rows: TableRow[] = [
    waterRow({ signed, figures, words }),
    ...signed.content.components.map((_component, index) => componentRow({ signed, figures, words }, index)),
    sprayRow({ signed, words }),
  ]
  const last = rows.at(-2)
  if (last) last.keepsWithNext = true
  return { x: place.x, columns: columns(words, place.width), rows, leading: STYLES.body.leading, padding: 2.4, showsHeads: true }
}

/** What stands beside the head: what the mix was sized from and how a ratio reads. */
export function mixAside({ content }: SignedRecord, { say, typed, unit }: ReportWords): string {
  const { water } = content
  const sized = water === null || water.sizedFrom === 'none' ? []
    : [water.sizedFrom === 'water' ? say('mix.sizedWater') : say('mix.sizedRate', { value: typed(water.value), unit: unit(water.unit) })]
  const ratio = content.components.some(({ basis }) => basis.kind === 'ratio') ? [say('mix.ratioMeans')] : []
  return [...sized, ...ratio].join('; ')
}

function columns({ say }: ReportWords, width: number): Column[] {
  const fixed: Column[] = [
    { head: say('mix.lot'), width: 74 },
    { head: say('mix.measure'), width: 78 },
    { head: say('mix.known'), width: 60 },
    { head: say('mix.inAll'), width: 62, align: 'right', opensAccount: true },
    { head: say('mix.perHa'), width: 50, align: 'right' },
    { head: say('mix.fullLoad'), width: 44, align: 'right' },
    { head: say('mix.lastLoad'), width: 44, align: 'right' },
  ]
  return [{ head: say('mix.ingredient'), width: width - fixed.reduce((sum, column) => sum + column.width, 0) }, ...fixed]
}

type RowInput = Omit<MixInput, 'place'>

function waterRow({ signed, figures, words }: RowInput): TableRow {
  const { say } = words
  const water = signed.content.water?.sizedFrom === 'none' ? null : signed.content.water
  const { sheet, agrees } = figures
  const { waterL } = signed.computed
  return {
    hasHead: true,
    cells: [
      plain(say('mix.water')),
      plain(water?.source ?? say('lines.none')),
      plain(water === null ? say('lines.none') : words.quantity(water.value, water.unit)),
      plain(water === null ? say('lines.none') : say(water.sizedFrom === 'water' ? 'known.typed' : 'known.workedOut')),
      bold(waterL === null ? say('lines.none') : words.worked(waterL, 'L')),
      plain(derived(words, agrees ? sheet.water.perHa : null)),
      plain(derived(words, agrees ? sheet.water.perFullLoad : null)),
      plain(derived(words, agrees ? sheet.water.perLastLoad : null)),
    ],
  }
}

function componentRow({ signed, figures, words }: RowInput, index: number): TableRow {
  const { say } = words
  const component = signed.content.components[index]
  const material = signed.materials.find(({ id }) => id === component?.materialId)
  const lot = signed.lots.find(({ id }) => id === component?.lotId)
  if (!component || !material) throw new RangeError(`the record does not hold the material of component ${index}`)
  const worked = figures.agrees ? figures.sheet.components[index] : undefined
  const amount = signed.computed.components[index]?.amount
  const perHa = worked?.perHa ?? null
  return {
    hasHead: true,
    cells: [
      plain(material.name),
      plain(lot ? say('mix.lotCode', { code: lot.code }) : say('mix.noLot')),
      plain(measureOf(component.basis, words)),
      plain(say('known.workedOut')),
      bold(amount ? words.worked(amount.value, amount.unit) : say('lines.none')),
      plain(perHa === null || amount?.unit === 'L' ? derived(words, perHa) : words.worked(perHa, worked?.inKg === null ? 'L' : 'kg')),
      plain(derived(words, worked?.perFullLoad ?? null)),
      plain(derived(words, worked?.perLastLoad ?? null)),
    ],
  }
}

function sprayRow({ signed, words }: Omit<RowInput, 'figures'>): TableRow {
  const { say } = words
  const { totalL, sprayLPerHa, loads } = signed.computed
  const none = say('lines.none')
  const hasLast = loads !== null && Number(loads.lastL) > 0
  return {
    isTotal: true, hasHead: true, runsOver: { column: 0, columns: 4 },
    cells: [
      bold(sprayName(loads, words)), [], [], [],
      bold(totalL === null ? none : words.worked(totalL, 'L')),
      bold(sprayLPerHa === null ? none : words.amount(sprayLPerHa)),
      bold(loads && loads.full > 0 ? words.amount(loads.tankL) : none),
      bold(loads && hasLast ? words.amount(loads.lastL) : none),
    ],
  }
}

function sprayName(loads: SignedRecord['computed']['loads'], words: ReportWords): string {
  const { say } = words
  if (!loads) return say('mix.spray')
  const full = loads.full === 1 ? say('mix.fullOne') : say('mix.fullMany', { count: loads.full })
  const params = { full, tank: words.amount(loads.tankL), last: words.amount(loads.lastL) }
  if (loads.full === 0) return say('mix.sprayLast', params)
  return say(Number(loads.lastL) > 0 ? 'mix.sprayFullLast' : 'mix.sprayFull', params)
}

function measureOf(basis: Basis, words: ReportWords): string {
  if (basis.kind === 'ratio') return words.say('mix.ratio', { parts: words.typed(basis.parts) })
  if (basis.kind === 'perArea') return words.quantity(basis.value, basis.unit)
  return words.say('mix.perTank', { value: words.typed(basis.value), unit: words.unit(basis.unit) })
}

function derived(words: ReportWords, value: string | null): string {
  return value === null ? words.say('lines.none') : words.amount(value)
}
