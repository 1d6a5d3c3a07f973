import { freshStops } from '../../../shared/checks/freshStops.ts'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { Check } from '../../../shared/contract/record.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import type { JudgedRecord } from './judgeRecord.ts'

/** Reasons about a lot that was short: they stand while the record takes the same out of the same lots. */
const LOT_CODES = ['lot.short', 'lot.left']

/**
 * The reasons of an amendment: those sent, and of the version before those about something that is unchanged. What is new asks anew:
 * beside a new stop, what was said of all stops goes on as the reason of each that stood.
 */
export function carryReasons(
  sent: Acknowledged,
  before: SignedRecord,
  { content, judged }: { content: RecordContent; judged: JudgedRecord },
): Acknowledged {
  const isSameWork = workText(content) === workText(before.content)
  const isSameDraw = takes(content, judged.computed) === takes(before.content, before.computed)
  const fresh = new Set(freshStops(withoutLotLeft(judged.checks), withoutLotLeft(before.checks)).map(({ code }) => code))
  const isShortAnew = !isSameDraw && judged.checks.some(({ code, verdict }) => code === 'lot.left' && verdict === 'stop')
  const stands = (code: string): boolean => {
    if (LOT_CODES.includes(code)) return isSameDraw
    if (code === 'record.stop') return fresh.size === 0 && !isShortAnew
    if (code === 'record.late') return true
    return before.checks.some((check) => check.code === code) ? !fresh.has(code) : isSameWork
  }
  const ofEach = before.acknowledged.filter(({ code }) => code === 'record.stop' && !stands(code)).flatMap(({ reason }) => stopCodes(before.checks).map((code) => ({ code, reason })))
  const known = [...before.acknowledged, ...ofEach].filter(({ code }) => stands(code))
  const given = new Set(sent.map(({ code }) => code))
  return [...sent, ...known.filter(({ code }, at) => !given.has(code) && known.findIndex((one) => one.code === code) === at)]
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
function withoutLotLeft(checks: readonly Check[]): Check[] {
  return checks.filter(({ code }) => code !== 'lot.left')
}

function stopCodes(checks: readonly Check[]): string[] {
  return [...new Set(checks.filter(({ verdict }) => verdict === 'stop').map(({ code }) => code))]
}
