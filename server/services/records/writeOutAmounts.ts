import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { roundDecimal } from '../../../shared/units/roundDecimal.ts'

/** A worked-out amount is written to a tenth of a millilitre, or of a gram. */
const AMOUNT_DECIMALS = 4

/** Where no amount was written for a line, its share of the total stands there, said to be worked out. */
export function writeOutAmounts(content: RecordContent, sheet: RecordSheet): RecordContent {
  const lines = content.lines.map((line, index) => {
    if (line.amount !== null) return line
    const { shareL, shareKg } = sheet.lines[index] ?? { shareL: null, shareKg: null }
    const share = shareL ?? (content.method === 'solid' ? shareKg : null)
    if (share === null) return line
    const unit = shareL === null ? 'kg' as const : 'L' as const
    return { ...line, amount: { value: roundDecimal(share, AMOUNT_DECIMALS), unit, known: 'workedOut' as const } }
  })
  return { ...content, lines }
}
