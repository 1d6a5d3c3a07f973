import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { Check } from '../../../shared/contract/record.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import type { JudgedRecord } from './judgeRecord.ts'

/** Reasons about a lot that was short: they stand while the record takes the same out of the same lots. */
const LOT_CODES = ['lot.short', 'lot.left']

/**
 * The reasons of an amendment: those sent, and of the version before those about something that is unchanged. What is new asks anew.
 */
export function carryReasons(
  sent: Acknowledged,
  before: SignedRecord,
  { content, judged }: { content: RecordContent; judged: JudgedRecord },
): Acknowledged {
  const isSameWork = workText(content) === workText(before.content)
  const isSameDraw = takes(content, judged.computed) === takes(before.content, before.computed)
  const stood = new Set(stopsOf(before.checks).map(stopText))
  const fresh = stopsOf(judged.checks).filter((stop) => !stood.has(stopText(stop))).map(({ code }) => code)
  const isShortAnew = !isSameDraw && judged.checks.some(({ code, verdict }) => code === 'lot.left' && verdict === 'stop')
  const stands = (code: string): boolean => {
    if (LOT_CODES.includes(code)) return isSameDraw
    if (code === 'record.stop') return fresh.length === 0 && !isShortAnew
    if (code === 'record.late') return true
    return before.checks.some((check) => check.code === code) ? !fresh.includes(code) : isSameWork
  }
  const given = new Set(sent.map(({ code }) => code))
  return [...sent, ...before.acknowledged.filter(({ code }) => !given.has(code) && stands(code))]
}

/** What a version takes of which lot, as one text. */
export function takes({ components }: RecordContent, computed: { components: readonly { amount: { value: string; unit: string } | null }[] }): string {
  return canonicalText(components.map(({ lotId, used }, index) => {
    const amount = used ?? computed.components[index]?.amount ?? null
    return [lotId, amount && { value: amount.value, unit: amount.unit }]
  }))
}

function workText({ method, lines, components, water, sprayerId }: RecordContent): string {
  return canonicalText({ method, lines, components, water, sprayerId })
}

/** A lot that is short is told apart by what is drawn, since what it held changes with everybody's work. */
function stopsOf(checks: readonly Check[]): Check[] {
  return checks.filter(({ verdict, code }) => verdict === 'stop' && code !== 'lot.left')
}

function stopText({ code, about, text }: Check): string {
  return canonicalText({ code, about, text })
}
