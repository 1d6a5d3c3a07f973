import type Decimal from 'decimal.js'
import type { Check } from '../contract/record.ts'
import type { RecordSheet, SheetComponent } from '../mix/sheetTypes.ts'
import type { MessageId } from '../messages/en.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import { buildCheck, words, type Params } from './buildCheck.ts'
import { labelSource } from './labelSource.ts'
import type { FactMaterial } from './recordFacts.ts'
import { roundForReader } from './roundForReader.ts'
import { settle } from './settle.ts'

type Position = 'over' | 'under' | 'within'
const VERDICTS = { over: 'stop', under: 'caution', within: 'pass' } as const

function positionOf(percent: Decimal, low: string | null, high: string | null): Position {
  if (high !== null && percent.gt(high)) return 'over'
  if (low !== null && percent.lt(low)) return 'under'
  return 'within'
}

/** Which limits the label names, said in the sentence: a range, only a least or only a most. */
function limitWords(low: string | null, high: string | null): 'Range' | 'Least' | 'Most' {
  if (low === null) return 'Most'
  return high === null ? 'Least' : 'Range'
}

/**
 * Parts by volume in the finished spray, percent, against the strength the label asks for.
 * @returns null where the label sets none.
 */
export function judgeLabelStrength(material: FactMaterial, component: SheetComponent, sheet: RecordSheet, about: string): Check | null {
  const low = material.label?.minStrengthPct ?? null
  const high = material.label?.maxStrengthPct ?? null
  if (low === null && high === null) return null
  const base = { code: 'label.strength', rests: 'label', title: words('checks.labelStrength.title'), source: labelSource(material), about } as const
  const limits: Params = {
    material: material.name,
    ...(low === null ? {} : { low: roundForReader(low) }),
    ...(high === null ? {} : { high: roundForReader(high) }),
  }
  const kind = limitWords(low, high)
  if (component.inL === null || sheet.totalL === null || settle(sheet.totalL).lte(0)) {
    const id = component.inKg === null ? 'checks.labelStrength.noAmount' : 'checks.labelStrength.weighed'
    return buildCheck({ ...base, verdict: 'unknown', text: words(id, limits) })
  }
  const percent = settle(new ExactDecimal(component.inL).div(sheet.totalL).mul(100))
  const position = positionOf(percent, low, high)
  const value = roundForReader(percent.toFixed(), [low, high].filter((limit) => limit !== null))
  const id: MessageId = `checks.labelStrength.${position}${kind}`
  const sum = { part: roundForReader(component.inL), total: roundForReader(sheet.totalL) }
  return buildCheck({
    ...base,
    verdict: VERDICTS[position],
    text: words(id, { ...limits, ...sum, value }),
    figure: words('checks.figure.percent', { value }),
    band: { low: low === null ? null : Number(low), high: high === null ? null : Number(high), value, unit: '%' },
  })
}
