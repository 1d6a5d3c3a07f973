import { EACH } from '../../../shared/contract/each.ts'
import { partSchema, type Counts, type Part, type RecordContentInput } from '../../../shared/contract/recordContent.ts'
import type { Weather } from '../../../shared/contract/weather.ts'
import { partArea } from '../../../shared/geo/partArea.ts'
import type { SheetInput } from '../../../shared/mix/sheetTypes.ts'
import { lineCounts } from '../../../shared/records/lineCounts.ts'
import { mapPlainFields } from '../../../shared/records/plainFields.ts'
import type { SheetGround } from '../../../shared/records/sheetOf.ts'
import { toInstant, type InstantResult } from '../../../shared/time/toInstant.ts'
import { ExactDecimal, writeDecimal } from '../../../shared/units/exactDecimal.ts'
import { parseQuantityText } from '../../../shared/units/parseQuantityText.ts'
import { endMoment, type AmountDraft, type LineDraft, type MomentDraft, type PartDraft } from './lineDraft.ts'
import { writtenLines, type ComponentDraft, type ReadingDraft, type RecordDraft } from './recordDraft.ts'

/** The plain number of a text, or empty where it is none yet. */
export function numberOf(text: string, signed = false): string {
  const read = parseQuantityText(text, { signed })
  return read.ok ? read.value : ''
}

const orNull = (text: string): string | null => (text.trim() === '' ? null : text.trim())

/** The instant of a time on the farm's clock; null while it is not written whole. */
export function instantOf({ date, time, offset }: MomentDraft, zone: string): InstantResult | null {
  if (date === '' || time === '') return null
  return toInstant({ date, time, zone, ...(offset !== '' && { offset }) })
}

function instantText(moment: MomentDraft, zone: string): string | null {
  const read = instantOf(moment, zone)
  return read?.ok ? read.instant : null
}

/** A share as it is typed, `0.4`, `2/5` or `40 %`, as plain decimal text. */
function shareOf(text: string): string {
  const percent = /^(.*?)\s*%\s*$/.exec(text)?.[1]
  const number = numberOf(percent ?? text)
  return percent === undefined || !/^\d+(\.\d+)?$/.test(number) ? number : writeDecimal(new ExactDecimal(number).div(100))
}

const typedPart = ({ kind, fraction, from, to, of, geometry }: PartDraft): unknown => {
  switch (kind) {
    case 'whole':
      return { kind }
    case 'fraction':
      return { kind, fraction: shareOf(fraction) }
    case 'drawn':
      return { kind, geometry }
    default:
      return { kind, from: Number(numberOf(from)), to: Number(numberOf(to)), of: Number(numberOf(of)) }
  }
}

/** The part of a line once it is written whole, else null. */
export function partOf({ part }: Pick<LineDraft, 'part'>): Part | null {
  const read = partSchema.safeParse(typedPart(part))
  return read.success ? read.data : null
}

/** What is counted on a line, as far as it is written. */
export function countsOf({ counts }: Pick<LineDraft, 'counts'>): Counts {
  return Object.fromEntries(EACH.flatMap((each) => { const count = numberOf(counts[each]); return count === '' ? [] : [[each, count]] }))
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

function writtenWater(draft: RecordDraft): unknown {
  const water = waterOf(draft)
  if (draft.method === 'solid') return null
  if (water.sizedFrom === 'none') return water
  return water.value === '' ? null : { ...water, source: orNull(draft.water.source) }
}

/** An amount that was measured or counted; null where the sheet's stands. */
function writtenAmount({ value, unit, known }: AmountDraft): AmountDraft | null {
  const read = numberOf(value)
  return known === 'workedOut' || read === '' ? null : { value: read, unit, known }
}

/** What the sheet is worked out from, as far as it is typed. */
export function sheetInputOf(draft: RecordDraft, { blocks, sprayer }: SheetGround): SheetInput {
  return {
    lines: writtenLines(draft).map((line) => {
      const part = partOf(line)
      const blockM2 = Number(blocks.find(({ id }) => id === line.blockId)?.areaM2 ?? 0)
      return {
        areaM2: part === null || blockM2 === 0 ? 0 : partArea(part, blockM2),
        counts: lineCounts({ counts: countsOf(line), part: part ?? { kind: 'whole' } }),
        amount: writtenAmount(line.amount),
      }
    }),
    isDry: draft.method === 'solid',
    water: waterOf(draft),
    tankL: sprayer?.tankL ?? null,
    flowLPerMin: sprayer?.flowLPerMin ?? null,
    components: draft.components.map((component) => ({ basis: basisOf(component) })),
  }
}

function readingOf<Unit extends string>({ value, unit, kind }: ReadingDraft, signed = false): { value: string; unit: Unit; kind: ReadingDraft['kind'] } | null {
  const read = numberOf(value, signed)
  return read === '' ? null : { value: read, unit: unit as Unit, kind }
}

/** What was read of the weather; null where nothing was. */
export function weatherOf({ weather }: Pick<RecordDraft, 'weather'>): Weather | null {
  const written: Weather = {
    wind: readingOf(weather.wind),
    windFrom: weather.windFrom === '' ? null : weather.windFrom,
    air: readingOf(weather.air, true),
    humidity: readingOf(weather.humidity),
  }
  return Object.values(written).every((value) => value === null) ? null : written
}

/**
 * The record as it would be sent, with whatever is missing left empty. The contract decides if it may be: parse it with
 * `recordContentSchema`. An amount that is worked out is left to the server's sheet.
 * @param happened whether the ends and the amounts belong in it: they are what happened, not what is planned.
 */
export function contentOf(draft: RecordDraft, { zone, happened }: { zone: string; happened: boolean }): RecordContentInput {
  const content = {
    method: draft.method,
    lines: writtenLines(draft).map((line) => ({
      blockId: line.blockId,
      part: typedPart(line.part),
      counts: countsOf(line),
      stage: orNull(line.stage),
      bbch: orNull(line.bbch),
      startedAt: instantText(line.start, zone),
      endedAt: happened ? instantText(endMoment(line), zone) : null,
      amount: happened ? writtenAmount(line.amount) : null,
    })),
    components: draft.components.map((component) => ({
      materialId: component.materialId, lotId: orNull(component.lotId), basis: basisOf(component), used: happened ? writtenAmount(component.used) : null,
    })),
    water: writtenWater(draft),
    sprayerId: draft.method === 'solid' ? null : orNull(draft.sprayerId),
    workedInOn: draft.method === 'solid' ? orNull(draft.workedInOn) : null,
    weather: weatherOf(draft),
    protection: draft.protection,
    ...mapPlainFields(({ name }) => orNull(draft.plain[name])),
    doneById: orNull(draft.doneById),
  }
  return content as RecordContentInput
}
