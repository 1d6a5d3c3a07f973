import type Decimal from 'decimal.js'
import { ExactDecimal } from '../units/exactDecimal.ts'
import type { RecordFacts } from './recordFacts.ts'

/** The line that got most of the mix for its share, and how much of that share it got: a plain decimal, 1 where it got what the sheet gives it. */
export interface UnevenShare { share: string; blockId: string | null }

/**
 * A rate holds on each hectare, so the line that got most is judged, not the mean. An amount that was worked out is the sheet's own and says
 * nothing new. Where it is known what was really put into the tank (`isUsedKnown`), only how it was spread over the lines counts.
 * @returns `blockId` null where no line differs from another.
 */
export function unevenShare({ content, sheet: { lines } }: Pick<RecordFacts, 'content' | 'sheet'>, isUsedKnown: boolean): UnevenShare {
  const got = lines.map(({ shareL, shareKg, amountL, amountKg }, index) => {
    const share = new ExactDecimal(shareL ?? shareKg ?? 0)
    const isNew = content.lines[index]?.amount && content.lines[index].amount.known !== 'workedOut'
    const amount = isNew ? (shareL === null ? amountKg : amountL) : null
    return { blockId: content.lines[index]?.blockId ?? null, share, amount: amount === null ? share : new ExactDecimal(amount) }
  }).filter(({ share }) => share.gt(0))
  const sum = (of: 'share' | 'amount'): Decimal => got.reduce((total, line) => total.plus(line[of]), new ExactDecimal(0))
  const whole = isUsedKnown && sum('amount').gt(0) ? sum('amount').div(sum('share')) : new ExactDecimal(1)
  const factors = got.map(({ blockId, share, amount }) => ({ blockId, factor: amount.div(share).div(whole) }))
  const [most] = [...factors].sort((a, b) => b.factor.cmp(a.factor))
  if (!most) return { share: '1', blockId: null }
  const isEven = factors.every(({ factor }) => factor.minus(most.factor).abs().lt('0.001'))
  return { share: most.factor.toFixed(), blockId: isEven ? null : most.blockId }
}
