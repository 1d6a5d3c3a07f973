import type { ApplicationRecord } from '../../shared/contract/record.ts'
import type { Basis, Method, Water } from '../../shared/contract/recordContent.ts'
import type { Weather, WIND_POINTS, WEATHER_KINDS } from '../../shared/contract/weather.ts'
import type { Each } from '../../shared/contract/each.ts'
import { civilDateIn, civilTimeIn } from '../../shared/time/civilDate.ts'
import { toInstant } from '../../shared/time/toInstant.ts'
import { newId } from './newId.ts'
import { mapPlainFields, type PlainName } from '../../shared/records/plainFields.ts'

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
}

export interface ReadingDraft {
  value: string
  unit: string
  kind: (typeof WEATHER_KINDS)[number]
}

/** A time of the farm's clock; `offset` is chosen only where the clock shows it twice. */
export interface MomentDraft {
  date: string
  time: string
  offset: string
}

/** What the form of a record holds. */
export interface RecordDraft {
  step: 1 | 2
  method: Method
  blockId: string
  plain: Record<PlainName, string>
  /** Empty: the person who writes. */
  doneById: string
  sprayerId: string
  components: ComponentDraft[]
  water: { sizedFrom: Water['sizedFrom']; value: string; unit: string; source: string; each: Each; component: number }
  weather: { wind: ReadingDraft; windFrom: (typeof WIND_POINTS)[number] | ''; air: ReadingDraft; humidity: ReadingDraft }
  start: MomentDraft
  end: MomentDraft
  /** `value` is read only where it was measured or counted; worked out, it is the sheet's. */
  amount: { value: string; unit: string; known: 'measured' | 'counted' | 'workedOut' }
  /** Said of every stop that was sprayed all the same. */
  stop: { why: string; told: string; done: string }
  /** The revision the server gave last; null before it has the record. */
  revision: number | null
}

export const emptyComponent = (): ComponentDraft => ({ key: newId(), materialId: '', lotId: '', kind: 'ratio', value: '', unit: 'L', each: 'plant', reading: 'to' })
const emptyMoment = (): MomentDraft => ({ date: '', time: '', offset: '' })

/** A form with nothing in it yet. */
export const emptyRecord = (): RecordDraft => ({
  step: 1,
  method: 'foliar',
  blockId: '', plain: mapPlainFields(() => ''), doneById: '', sprayerId: '',
  components: [emptyComponent()],
  water: { sizedFrom: 'water', value: '', unit: 'L', source: '', each: 'plant', component: 0 },
  weather: {
    wind: { value: '', unit: 'ms', kind: 'readHere' },
    windFrom: '',
    air: { value: '', unit: 'degC', kind: 'readHere' },
    humidity: { value: '', unit: '%', kind: 'readHere' },
  },
  start: emptyMoment(),
  end: emptyMoment(),
  amount: { value: '', unit: 'L', known: 'workedOut' },
  stop: { why: '', told: '', done: '' },
  revision: null,
})

/** The farm's clock at an instant. */
export function momentAt(zone: string, instant: string): MomentDraft {
  const moment = { date: civilDateIn(zone, instant), time: civilTimeIn(zone, instant) }
  const read = toInstant({ ...moment, zone })
  if (read.ok || read.problem.id !== 'time.ambiguous') return { ...moment, offset: '' }
  const near = read.candidates.findLast((one) => Date.parse(one.instant) <= Date.parse(instant))
  return { ...moment, offset: near?.offset ?? '' }
}

function draftOfBasis(basis: Basis): Pick<ComponentDraft, 'kind' | 'value' | 'unit' | 'each' | 'reading'> {
  const blank = { each: 'plant', reading: 'to' } as const
  return basis.kind === 'ratio' ? { ...blank, kind: 'ratio', value: basis.parts, unit: 'L', reading: basis.reading } : { ...blank, ...basis }
}

function draftOfWater(water: Water | null): RecordDraft['water'] {
  const { water: empty } = emptyRecord()
  if (water === null) return empty
  return water.sizedFrom === 'none' ? { ...empty, sizedFrom: 'none' } : { ...empty, ...water, source: water.source ?? '' }
}

/** A new form with the mix, method, sprayer and those words of a record that carry over, for another block or another day. */
export function draftLike(record: ApplicationRecord): RecordDraft {
  const empty = emptyRecord()
  return {
    ...empty,
    method: record.method,
    plain: mapPlainFields(({ name, carriesOver }) => (carriesOver ? (record[name] ?? '') : '')),
    sprayerId: record.sprayerId ?? '',
    components: record.components.map(({ materialId, lotId, basis }) => ({ key: newId(), materialId, lotId: lotId ?? '', ...draftOfBasis(basis) })),
    water: draftOfWater(record.water),
  }
}

function draftOfWeather(weather: Weather): RecordDraft['weather'] {
  const { weather: empty } = emptyRecord()
  return { wind: weather.wind ?? empty.wind, windFrom: weather.windFrom ?? '', air: weather.air ?? empty.air, humidity: weather.humidity ?? empty.humidity }
}

/** The form of a record that was started: on this device or on another. */
export function draftOfRecord(record: ApplicationRecord, zone: string): RecordDraft {
  const line = record.lines[0]
  const like = draftLike(record)
  return {
    ...like,
    step: record.state === 'started' ? 2 : 1,
    blockId: line?.blockId ?? '',
    plain: mapPlainFields(({ name }) => record[name] ?? ''),
    doneById: record.doneById ?? '',
    weather: record.weather === null ? like.weather : draftOfWeather(record.weather),
    start: line?.startedAt ? momentAt(zone, line.startedAt) : like.start,
    end: line?.endedAt ? momentAt(zone, line.endedAt) : like.end,
    amount: line?.amount ?? like.amount,
    revision: record.revision,
  }
}
