import { EACH } from '../../../shared/contract/each.ts'
import type { Computed, RecordState, RegisterRow } from '../../../shared/contract/record.ts'
import type { BlockLine, Part, RecordComponent, RecordContent } from '../../../shared/contract/recordContent.ts'
import { cutCheckCode } from '../../../shared/evidence/checkCode.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'
import { fillComputed, fillContent } from '../../../shared/records/fillStored.ts'
import { mapPlainFields, PLAIN_FIELDS } from '../../../shared/records/plainFields.ts'
import { isoInZone } from '../../../shared/time/isoInZone.ts'
import { decimalTextOf } from '../../../shared/units/decimalTextOf.ts'
import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'
import { roundDecimal } from '../../../shared/units/roundDecimal.ts'
import { roundParts } from '../../../shared/units/roundParts.ts'
import type { KeyedRow } from './listRegister.ts'
import { M2_PER_HA } from '../../../shared/units/hectare.ts'

const FIGURES = [
  'record', 'version', 'state', 'season', 'method', 'block', 'part', 'areaHa', 'counts', 'stage', 'bbch', 'start', 'end', 'zone', 'amount', 'unit', 'known',
  'mixL', 'massKg', 'keepOutUntil', 'pickFrom', 'preparations', 'lots', 'water', 'litresPerHa', 'kgPerHa', 'doneBy',
  'signedAt', 'lateHours', 'stops', 'cautions', 'unknowns', 'checkCode',
] as const
const WORDS = PLAIN_FIELDS.map(({ name }) => name)
/** The columns of the register as CSV, in their order; what was written in words stands last. */
export const CSV_COLUMNS = [...FIGURES, ...WORDS]
type CsvColumn = (typeof CSV_COLUMNS)[number]
type CsvLine = Record<CsvColumn, string>

/** The head of a column. */
export function csvHead(column: CsvColumn, language: Language): string {
  const isWords = WORDS.some((name) => name === column)
  return translate(language, isWords ? `records.plain.${column}.label` : `registerPrint.csv.${column}`)
}

export interface CsvRecord extends KeyedRow {
  state: RecordState
  register_row: Omit<RegisterRow, 'id' | 'state'>
  content: RecordContent
  computed: Computed
  digest: string | null
}
interface CsvPlace { language: Language; zone: string }

const DECIMALS = 4

/** The lines of one record: one for each of its block lines, in their order. */
export function csvLines({ state, register_row: row, content: stored, computed: storedFigures, digest }: CsvRecord, place: CsvPlace): CsvLine[] {
  const content = fillContent(stored)
  const computed = fillComputed(storedFigures)
  const say = (id: string, params = {}) => translate(place.language, `registerPrint.${id}`, params)
  const whole = {
    ...mapPlainFields(({ name }) => content[name] ?? ''),
    record: row.number ?? '',
    version: row.version === 0 ? '' : String(row.version),
    state: say(`state.${state}`),
    season: row.season === null ? '' : String(row.season),
    method: say(`method.${row.method}`),
    zone: place.zone,
    preparations: content.components.map((component, index) => preparationWords(component, row.preparations[index] ?? '', computed.components[index]?.amount ?? null, place)).join('; '),
    lots: lotsInOrder(content.components, row.lots, say('noLot')).join('; '),
    water: content.water !== null && 'source' in content.water ? content.water.source ?? '' : '',
    litresPerHa: figure(row.sprayLPerHa),
    kgPerHa: figure(row.kgPerHa),
    doneBy: row.by,
    signedAt: instant(row.signedAt, place),
    lateHours: row.lateHours === null ? '' : String(row.lateHours),
    stops: String(row.tally.stop),
    cautions: String(row.tally.caution),
    unknowns: String(row.tally.unknown),
    checkCode: digest === null ? '' : cutCheckCode(digest),
  }
  const parts = partsOf(row, computed)
  return content.lines.map((line, index) => ({ ...whole, ...lineCells(line, { row, computed, index }, place), ...parts(index) }))
}

/** What a column is added up by: each block's own area and share of the mix, which come to those of the record. Figures of one line alone are the record's. */
function partsOf(row: CsvRecord['register_row'], { lines, totalL, totalKg }: Computed): (index: number) => Pick<CsvLine, 'areaHa' | 'mixL' | 'massKg'> {
  const isAlone = lines.length === 0 && row.blocks.length === 1
  const parts = (whole: string | null, shares: (string | null)[]): string[] => {
    if (isAlone) return [figure(whole)]
    const known = shares.filter((share) => share !== null)
    return known.length === lines.length ? roundParts(known, DECIMALS) : []
  }
  const areas = parts(row.areaHa, lines.map(({ areaM2 }) => new ExactDecimal(areaM2).div(M2_PER_HA).toFixed()))
  const litres = parts(textOf(totalL), lines.map(({ shareL }) => shareL))
  const kilograms = parts(textOf(totalKg), lines.map(({ shareKg }) => shareKg))
  return (index) => ({ areaHa: areas[index] ?? '', mixL: litres[index] ?? '', massKg: kilograms[index] ?? '' })
}

function lineCells(line: BlockLine, { row, computed, index }: { row: CsvRecord['register_row']; computed: Computed; index: number }, place: CsvPlace) {
  const share = computed.lines[index] as Computed['lines'][number] | undefined
  return {
    block: row.blocks[index]?.code ?? '',
    part: partWords(line.part, place),
    counts: EACH.flatMap((each) => (line.counts[each] === undefined ? [] : [`${line.counts[each]} ${translate(place.language, `registerPrint.each.${each}`)}`])).join('; '),
    stage: line.stage ?? '',
    bbch: line.bbch ?? '',
    start: instant(line.startedAt, place),
    end: instant(line.endedAt, place),
    amount: line.amount?.value ?? '',
    unit: line.amount?.unit ?? '',
    known: line.amount === null ? '' : translate(place.language, `registerPrint.known.${line.amount.known}`),
    keepOutUntil: instant(share?.reEntryUntil ?? null, place),
    pickFrom: share?.pickFrom ?? '',
  }
}

function partWords(part: Part, { language }: CsvPlace): string {
  const say = (params: Record<string, string | number> = {}) => translate(language, `registerPrint.part.${part.kind}`, params)
  if (part.kind === 'fraction') return say({ percent: new ExactDecimal(part.fraction).times(100).toFixed() })
  return part.kind === 'rows' || part.kind === 'beds' ? say({ from: part.from, to: part.to, of: part.of }) : say()
}

function preparationWords({ used }: RecordComponent, name: string, amount: { value: string; unit: string } | null, { language }: CsvPlace): string {
  const say = (id: string, params: Record<string, string>) => translate(language, `registerPrint.${id}`, params)
  const words = (one: { value: string; unit: string }) => say('quantity', { value: figure(one.value), unit: translate(language, `units.${one.unit}`) })
  const measure = amount === null ? '–' : words(amount)
  return used === null ? say('preparation', { name, measure }) : say('preparationUsed', { name, measure, amount: words(used) })
}

/** The register row names lots alone; a component without one keeps its place. */
function lotsInOrder(components: readonly RecordComponent[], lots: readonly string[], none: string): string[] {
  let next = 0
  return components.map(({ lotId }) => {
    if (lotId === null) return none
    next += 1
    return lots[next - 1] ?? none
  })
}

const figure = (value: string | null): string => (value === null ? '' : roundDecimal(value, DECIMALS))
const textOf = (value: number | null): string | null => (value === null ? null : decimalTextOf(value))
const instant = (at: string | null, { zone }: CsvPlace): string => (at === null ? '' : isoInZone(zone, at))
