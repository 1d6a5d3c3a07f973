import { recordContentSchema } from '../../shared/contract/recordContent.ts'
import type { MessageId } from '../../shared/messages/en.ts'
import type { RecordSheet } from '../../shared/mix/sheetTypes.ts'
import { parseQuantityText } from '../../shared/units/parseQuantityText.ts'
import { contentOf, instantOf } from './recordContent.ts'
import type { RecordDraft } from './recordDraft.ts'
import { PLAIN_FIELDS } from '../../shared/records/plainFields.ts'

/** What is missing or cannot be read, by the path of the field in the record. */
export type Gaps = Partial<Record<string, MessageId>>

interface GapFacts {
  draft: RecordDraft
  sheet: RecordSheet
  zone: string
}

/** Fields that hold something that is no number; an empty field is not one of them. Shown as one types. */
export function unreadable({ weather, amount, water, components }: RecordDraft): Gaps {
  const isBad = (text: string, signed = false): boolean => text.trim() !== '' && !parseQuantityText(text, { signed }).ok
  return {
    ...(isBad(weather.wind.value) && { 'weather.wind': 'records.gap.number' }),
    ...(isBad(weather.air.value, true) && { 'weather.air': 'records.gap.number' }),
    ...(isBad(weather.humidity.value) && { 'weather.humidity': 'records.gap.number' }),
    ...(isBad(water.value) && { water: 'records.gap.number' }),
    ...Object.fromEntries(components.flatMap(({ value }, index) => (isBad(value) ? [[`components.${index}.basis`, 'records.gap.number' as const]] : []))),
    ...(amount.known !== 'workedOut' && isBad(amount.value) && { 'lines.0.amount': 'records.gap.number' }),
  }
}

const WORDS_AND_WEATHER = new Set<string>(['weather', ...PLAIN_FIELDS.map(({ name }) => name)])

/** What the contract itself refuses of the weather and the words: a humidity over 100, a note too long. */
function refused({ draft, sheet, zone }: GapFacts): Gaps {
  const read = recordContentSchema.safeParse(contentOf(draft, { zone, sheet, happened: draft.step === 2 }))
  if (read.success) return {}
  const issues = read.error.issues.filter(({ path }) => WORDS_AND_WEATHER.has(String(path[0])))
  return Object.fromEntries(issues.map(({ path }) => [path.slice(0, 2).join('.'), 'records.gap.unfit' as const]))
}

/** What keeps a record from being started, worst first; the first is what the button says. */
export function startGap(facts: GapFacts): MessageId | null {
  const { draft, sheet } = facts
  if (draft.blockId === '') return 'records.ready.needBlock'
  if (draft.components.length === 0 || draft.components.some(({ materialId }) => materialId === '')) return 'records.ready.needMaterial'
  if (sheet.totalL === null || sheet.components.some(({ amount }) => amount === null)) return 'records.ready.needMix'
  return Object.keys({ ...refused(facts), ...unreadable(draft) }).length > 0 ? 'records.ready.needFields' : null
}

function timeGaps({ start, end }: RecordDraft, zone: string): Gaps {
  const from = instantOf(start, zone)
  const to = instantOf(end, zone)
  const gaps: Gaps = {}
  if (from === null) gaps['lines.0.startedAt'] = 'records.sign.needStart'
  if (to === null) gaps['lines.0.endedAt'] = 'records.sign.needEnd'
  if (from !== null && !from.ok) gaps['lines.0.startedAt'] = 'records.gap.time'
  if (to !== null && !to.ok) gaps['lines.0.endedAt'] = 'records.gap.time'
  if (from?.ok && to?.ok && Date.parse(to.instant) < Date.parse(from.instant)) gaps['lines.0.endedAt'] = 'records.sign.endBeforeStart'
  return gaps
}

function lotGaps({ components }: RecordDraft): Gaps {
  const missing = components.flatMap(({ lotId }, index) => (lotId === '' ? [`components.${index}.lotId`] : []))
  return Object.fromEntries(missing.map((path) => [path, 'records.sign.needLot' as const]))
}

/** What keeps a record from being signed, by field: never what a check says. */
export function signGaps(facts: GapFacts & { hasStops: boolean }): Gaps {
  const { draft, sheet, zone, hasStops } = facts
  const hasMix = draft.components.length > 0 && sheet.totalL !== null && sheet.components.every(({ amount }) => amount !== null)
  const hasAmount = draft.amount.known === 'workedOut' ? sheet.totalL !== null : parseQuantityText(draft.amount.value).ok
  return {
    ...refused(facts),
    ...(draft.blockId === '' && { 'lines.0.blockId': 'records.sign.needBlock' }),
    ...(!hasMix && { components: 'records.sign.needMix' }),
    ...lotGaps(draft),
    ...(!hasAmount && { 'lines.0.amount': 'records.sign.needAmount' }),
    ...timeGaps(draft, zone),
    ...unreadable(draft),
    ...(hasStops && Object.fromEntries(
      (['why', 'told', 'done'] as const).filter((name) => draft.stop[name].trim() === '').map((name) => [`stop.${name}`, 'records.stop.needed' as const]),
    )),
  }
}
