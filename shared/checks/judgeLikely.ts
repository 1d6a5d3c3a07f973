import type { Check } from '../contract/record.ts'
import { convertQuantity } from '../units/convertQuantity.ts'
import { asUsed } from './asUsed.ts'
import { buildCheck, words } from './buildCheck.ts'
import type { RecordFacts } from './recordFacts.ts'
import { roundForReader } from './roundForReader.ts'

const MINUTE_MS = 60_000
/** A stretch on one block that is longer is asked about, minutes. */
const LONG_MIN = 12 * 60
/** Times as fast as the sprayer puts out, times as much or as little as the mix makes it: a slip of the hand. */
const FAST = 2
const MUCH = 3
/** Less of a mix than this part on the land: what stays in a tank and its hoses is less than a tenth. House rule. */
const LITTLE = 0.9
/** More than a mix holds, as part of it: what goes beyond reading a mark is asked about here and at the signature. */
export const MOST_OVER = 0.02
/** No day for work outside. Wind from strong gale on, m/s; air, °C. @source Beaufort 9 begins at 20.8 m/s, WMO No. 8, table of wind speeds; air is a house rule. */
const READINGS = { wind: { unit: 'ms', low: 0, high: 20.8 }, air: { unit: 'degC', low: -10, high: 45 } } as const

/** What a time on a block can be asked about. */
const TIME_WORST_FIRST = ['none', 'fast', 'long'] as const

const ask = (code: string, about: string, parts: Pick<Check, 'title' | 'text'>): Check => buildCheck({ code, verdict: 'caution', rests: 'house', about, ...parts })

/** Times of a line that cannot be what was meant: none at all, one that the sprayer is too slow for, or more than half a day. One question, of the worst; its title names every block that is meant, the worst first. */
function askTime({ content, sheet, blocks }: RecordFacts): Check[] {
  const { fullMinutes, tankL } = sheet.loads ?? { fullMinutes: null, tankL: 0 }
  const flow = fullMinutes ? tankL / fullMinutes : null
  const found = content.lines.flatMap(({ blockId, startedAt, endedAt }, index) => {
    const { shareL = null, amountL = null, shareKg = null, amountKg = null } = sheet.lines[index] ?? {}
    const litres = Number(amountL ?? shareL ?? 0)
    const value = litres || Number(amountKg ?? shareKg ?? 0)
    const minutes = startedAt === null || endedAt === null ? -1 : (Date.parse(endedAt) - Date.parse(startedAt)) / MINUTE_MS
    const need = flow === null ? 0 : litres / flow
    const said: (typeof TIME_WORST_FIRST)[number] | null = minutes < 0 || value === 0 ? null : minutes === 0 ? 'none' : minutes > LONG_MIN ? 'long' : minutes * FAST < need ? 'fast' : null
    if (said === null) return []
    const params = {
      code: blocks.find(({ id }) => id === blockId)?.code ?? '', value: roundForReader(value), unit: litres > 0 ? 'L' : 'kg', minutes: roundForReader(minutes), hours: roundForReader(minutes / 60),
      ...(flow !== null && { flow: roundForReader(flow), flowUnit: 'L', need: Math.ceil(need) }),
    }
    return [{ said, index, params }]
  })
  const inOrder = TIME_WORST_FIRST.flatMap((one) => found.filter(({ said }) => said === one))
  const codes = [...new Set(inOrder.map(({ params }) => params.code))].join(', ')
  return inOrder.slice(0, 1).map(({ said, index, params }) =>
    ask('house.time', `line:${index}`, { title: words('likely.time.title', { code: codes }), text: words(`likely.time.${said}`, params) }))
}

/** Less on the land than was mixed: an amount is missing, or the rest went somewhere. More than was mixed: a slip, or the wrong unit. */
function askApplied({ sheet }: RecordFacts): Check[] {
  const { appliedL, totalL, appliedKg, totalKg } = sheet
  const [applied, total, unit] = totalL === null ? [appliedKg, totalKg, 'kg'] : [appliedL, totalL, 'L']
  if (applied === null || total === null) return []
  const figures = { applied: roundForReader(applied), total: roundForReader(total), unit }
  const said = Number(applied) > total * (1 + MOST_OVER) ? words('likely.applied.over', figures)
    : Number(applied) < total * LITTLE ? words('likely.applied.text', { ...figures, rest: roundForReader(total - Number(applied)) })
    : null
  return said === null ? [] : [ask('house.applied', 'line:0', { title: words('likely.applied.title'), text: said })]
}

/** What was really taken of an ingredient, far from what the mix makes it. */
function askUsed({ content, sheet, materials }: RecordFacts): Check[] {
  return content.components.flatMap(({ materialId, used }, index) => {
    const planned = sheet.components[index]
    const taken = planned && asUsed(planned, used)
    if (!planned?.amount || !taken?.amount || taken === planned) return []
    const times = Number(taken.amount.value) / Number(planned.amount.value)
    if (times < MUCH && times > 1 / MUCH) return []
    const material = materials.find(({ id }) => id === materialId)?.name ?? ''
    const figures = { value: roundForReader(taken.amount.value), planned: roundForReader(planned.amount.value), unit: planned.amount.unit, percent: roundForReader(100 * times, [], 3) }
    return [ask('house.used', `component:${index}`, { title: words('likely.used.title', { material }), text: words('likely.used.text', figures) })]
  })
}

/** A reading of no day for work outside, as it was typed: the unit may be another one. */
function askReadings({ content: { weather } }: RecordFacts): Check[] {
  return (['wind', 'air'] as const).flatMap((name) => {
    const reading = weather?.[name]
    const { unit, low, high } = READINGS[name]
    if (!reading) return []
    const value = Number(convertQuantity({ value: reading.value, unit: reading.unit }, unit))
    if (value >= low && value <= high) return []
    return [ask(`house.${name}Read`, name, { title: words(`likely.reading.${name}`), text: words('likely.reading.text', { value: Number(reading.value), unit: reading.unit, low, high, limitUnit: unit }) })]
  })
}

/** Figures that can be, and are seldom meant: asked about in words, never refused. */
export function judgeLikely(facts: RecordFacts): Check[] {
  return [...askTime(facts), ...askApplied(facts), ...askUsed(facts), ...askReadings(facts)]
}
