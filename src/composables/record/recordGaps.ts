import { EACH } from '../../../shared/contract/each.ts'
import { recordContentSchema } from '../../../shared/contract/recordContent.ts'
import type { MessageId } from '../../../shared/messages/en.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { PLAIN_FIELDS } from '../../../shared/records/plainFields.ts'
import { parseQuantityText } from '../../../shared/units/parseQuantityText.ts'
import type { Gaps } from './gaps.ts'
import { endMoment, type LineDraft } from './lineDraft.ts'
import { contentOf, instantOf, partOf } from './recordContent.ts'
import { yearFaults } from './timeFaults.ts'
import { writtenLines, type ComponentDraft, type RecordDraft } from './recordDraft.ts'

interface GapFacts {
  draft: RecordDraft
  sheet: RecordSheet
  zone: string
}

const isBad = (text: string, signed = false): boolean => text.trim() !== '' && !parseQuantityText(text, { signed }).ok

/** A figure that must be above 0: what is no number, and 0 itself; an empty field is neither. */
function positiveGap(text: string, zero: MessageId = 'recordForm.gap.aboveZero'): MessageId | null {
  if (text.trim() === '') return null
  const read = parseQuantityText(text)
  if (!read.ok) return read.problem.id === 'number.ambiguous' ? 'records.gap.ambiguous' : 'records.gap.number'
  return Number(read.value) > 0 ? null : zero
}

function componentGap({ kind, value, reading }: ComponentDraft): MessageId | null {
  if (kind !== 'ratio') return positiveGap(value)
  const gap = positiveGap(value, 'recordForm.gap.ratioZero')
  const read = parseQuantityText(value)
  return gap ?? (reading === 'in' && read.ok && Number(read.value) < 1 ? 'problems.ratio.in_below_one' : null)
}

/** What cannot be a part: a share above the whole, rows that are not there; one half typed is not one of them. */
function partGap({ part }: LineDraft): MessageId | null {
  const { kind, fraction, from, to, of } = part
  if (kind === 'fraction') return fraction.trim() !== '' && partOf({ part }) === null ? 'problems.part.fraction' : null
  if (kind !== 'rows' && kind !== 'beds') return null
  const typed = [from, to, of].filter((text) => text.trim() !== '')
  if (typed.some((text) => !/^\s*[1-9]\d{0,3}\s*$/.test(text))) return 'problems.number.whole'
  return typed.length === 3 && partOf({ part }) === null ? 'problems.part.span' : null
}

function countGaps({ counts }: LineDraft, path: string): Gaps {
  return Object.fromEntries(EACH.flatMap((each) => {
    const gap = positiveGap(counts[each]) ?? (each !== 'rowM' && /[.,½¼¾/]/.test(counts[each]) ? 'problems.number.whole' : null)
    return gap === null ? [] : [[`${path}.counts.${each}`, gap]]
  }))
}

function lineGaps(line: LineDraft, index: number): Gaps {
  const path = `lines.${index}`
  const part = partGap(line)
  const amount = line.amount.known === 'workedOut' ? null : positiveGap(line.amount.value)
  return {
    ...(part !== null && { [`${path}.part`]: part }),
    ...countGaps(line, path),
    ...(line.bbch.trim() !== '' && !/^\d{2,3}$/.test(line.bbch.trim()) && { [`${path}.bbch`]: 'problems.bbch.format' as const }),
    ...(amount !== null && { [`${path}.amount`]: amount }),
  }
}

function componentGaps(component: ComponentDraft, index: number): Gaps {
  const basis = componentGap(component)
  const used = component.used.known === 'workedOut' ? null : positiveGap(component.used.value)
  return { ...(basis !== null && { [`components.${index}.basis`]: basis }), ...(used !== null && { [`components.${index}.used`]: used }) }
}

/** Fields that hold something that cannot stand; an empty field is not one of them. Shown as one types. */
export function unreadable(draft: RecordDraft): Gaps {
  const { weather, water, components } = draft
  const sized = water.sizedFrom === 'none' || draft.method === 'solid' ? null : positiveGap(water.value)
  return {
    ...(isBad(weather.wind.value) && { 'weather.wind': 'records.gap.number' }),
    ...(isBad(weather.air.value, true) && { 'weather.air': 'records.gap.number' }),
    ...(isBad(weather.humidity.value) && { 'weather.humidity': 'records.gap.number' }),
    ...(sized !== null && { water: sized }),
    ...Object.assign({}, ...components.map(componentGaps)) as Gaps,
    ...Object.assign({}, ...writtenLines(draft).map(lineGaps)) as Gaps,
  }
}

/** What is said of words in the contract's own terms. */
const OF_TEXT = ['too_long', 'too_many_lines', 'control', 'bidi_control'] as const
function wordsOf(issue: string): MessageId {
  const known = OF_TEXT.find((code) => issue === `text.${code}`)
  return known === undefined ? 'records.gap.unfit' : `problems.text.${known}`
}
const WORDS_AND_WEATHER = new Set<string>(['weather', ...PLAIN_FIELDS.map(({ name }) => name)])

/** What the contract itself refuses of the weather and the words: a humidity over 100, a note too long. */
function refused({ draft, zone }: GapFacts): Gaps {
  const read = recordContentSchema.safeParse(contentOf(draft, { zone, happened: draft.step === 2 }))
  if (read.success) return {}
  const issues = read.error.issues.filter(({ path }) => WORDS_AND_WEATHER.has(String(path[0])))
  return Object.fromEntries(issues.map(({ path, message }) => [path.slice(0, 2).join('.'), wordsOf(message)]))
}

/** Counts that the mix is sized by and a line lacks. */
function countsNeeded({ findings }: RecordSheet): Gaps {
  return Object.fromEntries(findings.flatMap(({ code, path }) => (code === 'sheet.count_needed' && path !== undefined ? [[path, 'recordForm.gap.countNeeded' as const]] : [])))
}

const isMixKnown = ({ totalL, totalKg, components }: RecordSheet): boolean =>
  (totalL !== null || totalKg !== null) && components.every(({ amount }) => amount !== null)

/** What keeps a record from being started, worst first; the first is what the button says. */
export function startGap(facts: GapFacts): MessageId | null {
  const { draft, sheet } = facts
  const lines = writtenLines(draft)
  if (lines.length === 0 || lines.some(({ blockId }) => blockId === '')) return 'records.ready.needBlock'
  if (lines.some((line) => partOf(line) === null)) return 'recordForm.ready.needPart'
  if (draft.components.length === 0 || draft.components.some(({ materialId }) => materialId === '')) return 'records.ready.needMaterial'
  if (Object.keys(countsNeeded(sheet)).length > 0) return 'recordForm.ready.needCounts'
  if (!isMixKnown(sheet)) return 'records.ready.needMix'
  return Object.keys({ ...refused(facts), ...unreadable(draft) }).length > 0 ? 'records.ready.needFields' : null
}

function timeGaps(line: LineDraft, index: number, zone: string): Gaps {
  const path = `lines.${index}`
  const from = instantOf(line.start, zone)
  const to = instantOf(endMoment(line), zone)
  const gaps: Gaps = {}
  if (from === null) gaps[`${path}.startedAt`] = 'records.sign.needStart'
  if (to === null) gaps[`${path}.endedAt`] = 'records.sign.needEnd'
  if (from !== null && !from.ok) gaps[`${path}.startedAt`] = 'records.gap.time'
  if (to !== null && !to.ok) gaps[`${path}.endedAt`] = 'records.gap.time'
  if (from?.ok && to?.ok && Date.parse(to.instant) < Date.parse(from.instant)) gaps[`${path}.endedAt`] = 'records.sign.endBeforeStart'
  return gaps
}

function lineSignGaps(line: LineDraft, index: number, { sheet, zone }: GapFacts): Gaps {
  const path = `lines.${index}`
  const share = sheet.lines[index]
  const hasAmount = line.amount.known === 'workedOut' ? (share?.shareL ?? share?.shareKg ?? null) !== null : parseQuantityText(line.amount.value).ok
  return {
    ...(partOf(line) === null && { [`${path}.part`]: 'recordForm.gap.partNeeded' as const }),
    ...(!hasAmount && { [`${path}.amount`]: 'records.sign.needAmount' as const }),
    ...timeGaps(line, index, zone),
  }
}

/** What keeps a record from being signed, by field: never what a check says. */
export function signGaps(facts: GapFacts & { hasStops: boolean }): Gaps {
  const { draft, sheet, hasStops } = facts
  const lines = writtenLines(draft)
  const hasMix = draft.components.length > 0 && isMixKnown(sheet)
  return {
    ...refused(facts),
    ...(lines.length === 0 && { lines: 'records.sign.needBlock' }),
    ...(!hasMix && { components: 'records.sign.needMix' }),
    ...countsNeeded(sheet),
    ...Object.assign({}, ...lines.map((line, index) => lineSignGaps(line, index, facts))) as Gaps,
    ...yearFaults(draft),
    ...unreadable(draft),
    ...(hasStops && Object.fromEntries(
      (['why', 'told', 'done'] as const).filter((name) => draft.stop[name].trim() === '').map((name) => [`stop.${name}`, 'records.stop.needed' as const]),
    )),
  }
}
