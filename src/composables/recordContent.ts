import type { RecordContentInput } from '../../shared/contract/recordContent.ts'
import type { Weather } from '../../shared/contract/weather.ts'
import type { RecordSheet, SheetInput } from '../../shared/mix/sheetTypes.ts'
import { toInstant, type InstantResult } from '../../shared/time/toInstant.ts'
import { formatNumber } from '../../shared/units/formatQuantity.ts'
import { parseQuantityText } from '../../shared/units/parseQuantityText.ts'
import type { ComponentDraft, MomentDraft, ReadingDraft, RecordDraft } from './recordDraft.ts'
import { mapPlainFields } from '../../shared/records/plainFields.ts'

/** The plain number of a text, or empty where it is none yet. */
function numberOf(text: string, signed = false): string {
  const read = parseQuantityText(text, { signed })
  return read.ok ? read.value : ''
}

/** The instant of a time on the farm's clock; null while it is not written whole. */
export function instantOf({ date, time, offset }: MomentDraft, zone: string): InstantResult | null {
  if (date === '' || time === '') return null
  return toInstant({ date, time, zone, ...(offset !== '' && { offset }) })
}

function instantText(moment: MomentDraft, zone: string): string | null {
  const read = instantOf(moment, zone)
  return read?.ok ? read.instant : null
}

function basisOf({ kind, value, unit, each, reading }: ComponentDraft): SheetInput['components'][number]['basis'] {
  if (kind === 'ratio') return { kind, parts: numberOf(value), reading }
  return kind === 'perEach' ? { kind, value: numberOf(value), unit, each } : { kind, value: numberOf(value), unit }
}

function waterOf({ water }: RecordDraft): NonNullable<SheetInput['water']> {
  const typed = { value: numberOf(water.value), unit: water.unit }
  switch (water.sizedFrom) {
    case 'none':
      return { sizedFrom: 'none' }
    case 'perEach':
      return { sizedFrom: 'perEach', ...typed, each: water.each }
    case 'jar':
      return { sizedFrom: 'jar', ...typed, component: water.component }
    default:
      return { sizedFrom: water.sizedFrom, ...typed }
  }
}

function writtenWater(draft: RecordDraft): SheetInput['water'] | (SheetInput['water'] & { source: string | null }) {
  const water = waterOf(draft)
  if (draft.method === 'solid') return null
  if (water.sizedFrom === 'none') return water
  return water.value === '' ? null : { ...water, source: orNull(draft.water.source) }
}

function writtenAmount({ amount }: RecordDraft): { value: string; unit: string } | null {
  const value = numberOf(amount.value)
  return amount.known === 'workedOut' || value === '' ? null : { value, unit: amount.unit }
}

/** What the sheet is worked out from, as far as it is typed. */
export function sheetInputOf(draft: RecordDraft, { areaM2, tankL }: { areaM2: number | null; tankL: string | null }): SheetInput {
  return {
    lines: areaM2 === null ? [] : [{ areaM2, amount: writtenAmount(draft) }],
    isDry: draft.method === 'solid',
    water: waterOf(draft),
    tankL,
    components: draft.components.map((component) => ({ basis: basisOf(component) })),
  }
}

function readingOf<Unit extends string>({ value, unit, kind }: ReadingDraft, signed = false): { value: string; unit: Unit; kind: ReadingDraft['kind'] } | null {
  const read = numberOf(value, signed)
  return read === '' ? null : { value: read, unit: unit as Unit, kind }
}

/** What was read of the weather; null where nothing was. */
export function weatherOf({ weather }: RecordDraft): Weather | null {
  const written: Weather = {
    wind: readingOf(weather.wind),
    windFrom: weather.windFrom === '' ? null : weather.windFrom,
    air: readingOf(weather.air, true),
    humidity: readingOf(weather.humidity),
  }
  return Object.values(written).every((value) => value === null) ? null : written
}

function amountOf(draft: RecordDraft, sheet: RecordSheet): { value: string; unit: string; known: string } | null {
  const written = writtenAmount(draft)
  if (written) return { ...written, known: draft.amount.known }
  if (draft.amount.known !== 'workedOut' || sheet.totalL === null) return null
  return { value: formatNumber(sheet.totalL, {}, 'en').replaceAll('\u00A0', ''), unit: 'L', known: 'workedOut' }
}

const orNull = (text: string): string | null => (text.trim() === '' ? null : text.trim())

/**
 * The record as it would be sent, with whatever is missing left empty. The contract decides if it may be: parse it with
 * `recordContentSchema`.
 * @param happened whether the end and the amount belong in it: they are what happened, not what is planned.
 */
export function contentOf(draft: RecordDraft, { zone, sheet, happened }: { zone: string; sheet: RecordSheet; happened: boolean }): RecordContentInput {
  const content = {
    method: draft.method,
    lines: [{
      blockId: draft.blockId,
      part: { kind: 'whole' },
      startedAt: instantText(draft.start, zone),
      endedAt: happened ? instantText(draft.end, zone) : null,
      amount: happened ? amountOf(draft, sheet) : null,
    }],
    components: draft.components.map((component) => ({ materialId: component.materialId, lotId: orNull(component.lotId), basis: basisOf(component) })),
    water: writtenWater(draft),
    sprayerId: orNull(draft.sprayerId),
    weather: weatherOf(draft),
    ...mapPlainFields(({ name }) => orNull(draft.plain[name])),
    doneById: orNull(draft.doneById),
  }
  return content as RecordContentInput
}
