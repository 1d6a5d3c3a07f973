import type { Each } from '../contract/each.ts'
import { quantityFor, type Reader } from '../messages/readFigure.ts'
import { translate } from '../messages/translate.ts'
import { convertQuantity } from '../units/convertQuantity.ts'

/** Below so many litres it is read in millilitres. */
const SMALL_L = 0.1

/** What went on each plant or bed, in words, three digits of it. @param litres plain decimal text. */
export function presentEach(reader: Reader, { each, litres }: { each: Each; litres: string }): string {
  const isSmall = Number(litres) < SMALL_L
  const amount = quantityFor(reader, isSmall ? convertQuantity({ value: litres, unit: 'L' }, 'mL') : litres, isSmall ? 'mL' : 'L', { significant: 3 })
  return translate(reader.language, `register.perEach.${each}`, { amount })
}
