import type { Each } from '../../../shared/contract/each.ts'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import type { Basis, Method, PROTECTION, RecordComponent, Water } from '../../../shared/contract/recordContent.ts'
import type { Weather, WIND_POINTS, WEATHER_KINDS } from '../../../shared/contract/weather.ts'
import { mapPlainFields, type PlainName } from '../../../shared/records/plainFields.ts'
import { draftOfLine, emptyAmount, type AmountDraft, type LineDraft } from './lineDraft.ts'
import { readingUnit, type UnitSystem } from '../../../shared/units/readingUnit.ts'
import { newId } from '../form/newId.ts'

/** Everything below is as typed: numbers are text, and what is not chosen yet is empty. */
export interface ComponentDraft {
  key: string
  materialId: string
  lotId: string
  kind: Basis['kind']
  value: string
  /** Not read for a ratio. */
  unit: string
  /** Read for a rate by count. */
  each: Each
  /** Read for a ratio. */
  reading: 'to' | 'in'
  /** What was really taken, where it is not what the sheet says. */
  used: AmountDraft
}

export interface ReadingDraft {
  value: string
  unit: string
  kind: (typeof WEATHER_KINDS)[number]
}

/** What the form of a record holds. A change of its shape is a new `version`, and `readKeptDraft` reads the older ones. */
export interface RecordDraft {
  version: 2
  step: 1 | 2
  method: Method
  lines: LineDraft[]
  plain: Record<PlainName, string>
  protection: (typeof PROTECTION)[number][]
  /** Empty: the person who writes. */
  doneById: string
  sprayerId: string
  components: ComponentDraft[]
  water: { sizedFrom: Water['sizedFrom']; value: string; unit: string; source: string; each: Each; component: number }
  /** Read for a solid spread. */
  workedInOn: string
  weather: { wind: ReadingDraft; windFrom: (typeof WIND_POINTS)[number] | ''; air: ReadingDraft; humidity: ReadingDraft }
  /** Said of every stop that was sprayed all the same. */
  stop: { why: string; told: string; done: string }
  /** Jobs of season plans that it was opened from. */
  jobs: string[]
  /** The revision the server gave last; null before it has the record. */
  revision: number | null
}

export const emptyComponent = (units: UnitSystem = 'metric'): ComponentDraft => ({
  key: newId(), materialId: '', lotId: '', kind: 'ratio', value: '', unit: readingUnit('L', units), each: 'plant', reading: 'to', used: emptyAmount(),
})

/** A form with nothing in it yet. @param units whose units it begins with; another may be chosen beside each figure. */
export const emptyRecord = (units: UnitSystem = 'metric'): RecordDraft => ({
  version: 2,
  step: 1,
  method: 'foliar',
  lines: [], plain: mapPlainFields(() => ''), protection: [], doneById: '', sprayerId: '',
  components: [emptyComponent(units)],
  water: { sizedFrom: 'water', value: '', unit: readingUnit('L', units), source: '', each: 'plant', component: 0 },
  workedInOn: '',
  weather: {
    wind: { value: '', unit: readingUnit('ms', units), kind: 'readHere' },
    windFrom: '',
    air: { value: '', unit: readingUnit('degC', units), kind: 'readHere' },
    humidity: { value: '', unit: '%', kind: 'readHere' },
  },
  stop: { why: '', told: '', done: '' },
  jobs: [],
  revision: null,
})

/** The lines that go into the record, in their order: those that were not left out. */
export const writtenLines = ({ lines }: Pick<RecordDraft, 'lines'>): LineDraft[] => lines.filter(({ skipped }) => !skipped)

function draftOfBasis(basis: Basis): Pick<ComponentDraft, 'kind' | 'value' | 'unit' | 'each' | 'reading'> {
  const blank = { each: 'plant', reading: 'to' } as const
  return basis.kind === 'ratio' ? { ...blank, kind: 'ratio', value: basis.parts, unit: 'L', reading: basis.reading } : { ...blank, ...basis }
}

const draftOfComponent = ({ materialId, lotId, basis }: RecordComponent): ComponentDraft => ({
  ...emptyComponent(), materialId, lotId: lotId ?? '', ...draftOfBasis(basis),
})

function draftOfWater(water: Water | null, units: UnitSystem): RecordDraft['water'] {
  const { water: empty } = emptyRecord(units)
  if (water === null) return empty
  return water.sizedFrom === 'none' ? { ...empty, sizedFrom: 'none' } : { ...empty, ...water, source: water.source ?? '' }
}

/** A new form with the mix, method, sprayer and those words of a record that carry over, for another block or another day. */
export function draftLike(record: ApplicationRecord, units: UnitSystem = 'metric'): RecordDraft {
  return {
    ...emptyRecord(units),
    method: record.method,
    plain: mapPlainFields(({ name, carriesOver }) => (carriesOver ? (record[name] ?? '') : '')),
    protection: [...record.protection],
    sprayerId: record.sprayerId ?? '',
    components: record.components.map(draftOfComponent),
    water: draftOfWater(record.water, units),
  }
}

/** A new form with the method, mix and rate of a plan's step. */
export function draftOfPlan({ method, materialId, basis, water }: Pick<RecordComponent, 'materialId' | 'basis'> & { method: Method; water: Water | null }, units: UnitSystem = 'metric'): RecordDraft {
  return { ...emptyRecord(units), method, components: [draftOfComponent({ materialId, basis, lotId: null, used: null })], water: draftOfWater(water, units) }
}

function draftOfWeather(weather: Weather, units: UnitSystem): RecordDraft['weather'] {
  const { weather: empty } = emptyRecord(units)
  return { wind: weather.wind ?? empty.wind, windFrom: weather.windFrom ?? '', air: weather.air ?? empty.air, humidity: weather.humidity ?? empty.humidity }
}

/** The form of a record that was started: on this device or on another. */
export function draftOfRecord(record: ApplicationRecord, zone: string, units: UnitSystem = 'metric'): RecordDraft {
  const like = draftLike(record, units)
  return {
    ...like,
    step: record.state === 'started' ? 2 : 1,
    lines: record.lines.map((line) => draftOfLine(line, zone)),
    plain: mapPlainFields(({ name }) => record[name] ?? ''),
    components: record.components.map((component) => ({ ...draftOfComponent(component), used: component.used ?? emptyAmount() })),
    workedInOn: record.workedInOn ?? '',
    doneById: record.doneById ?? '',
    weather: record.weather === null ? like.weather : draftOfWeather(record.weather, units),
    revision: record.revision,
  }
}
