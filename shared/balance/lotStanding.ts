import { Decimal } from 'decimal.js'
import type { Lot } from '../contract/input.ts'
import { convertQuantity } from '../units/convertQuantity.ts'

/** A lot whose last day is this near is said to run out. */
export const SOON_DAYS = 14
/** A lot with no more than this share left is nearly empty. */
const LOW_SHARE = '0.1'
const DAY_MS = 86_400_000

export interface LotStanding {
  /** Its last day against today: none written, past, at most 14 days away, later. */
  useBy: 'none' | 'past' | 'soon' | 'later'
  /** Days from today to its last day; negative when past, null when none is written. */
  days: number | null
  stock: 'empty' | 'low' | 'some'
  /** What is left of what was received, 0 to 1 for drawing; more than was received draws as 1. */
  leftShare: number
}

type Facts = Pick<Lot, 'expiresOn' | 'quantity' | 'left'>

/**
 * How a lot stands on a day: against its last day and against what was received.
 * @param lot amounts as decimal text; its last day is still a day of use. @param today civil date of the farm, YYYY-MM-DD.
 */
export function lotStanding(lot: Facts, today: string): LotStanding {
  const share = new Decimal(convertQuantity(lot.left, lot.quantity.unit)).dividedBy(lot.quantity.value)
  const days = lot.expiresOn === null ? null : (Date.parse(lot.expiresOn) - Date.parse(today)) / DAY_MS
  return {
    useBy: useByOf(days),
    days,
    stock: share.lte(0) ? 'empty' : share.lte(LOW_SHARE) ? 'low' : 'some',
    leftShare: Decimal.min(Decimal.max(share, 0), 1).toNumber(),
  }
}

function useByOf(days: number | null): LotStanding['useBy'] {
  if (days === null) return 'none'
  if (days < 0) return 'past'
  return days <= SOON_DAYS ? 'soon' : 'later'
}
