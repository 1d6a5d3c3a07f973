import { toDayNumber } from '../time/dayNumber.ts'

/** A calibration due within so many days is soon due. */
const SOON_DAYS = 30

/**
 * How a calibration stands on a civil day, and how many days are left until the next is due (below zero: overdue).
 * @throws {RangeError} if one of them is no date.
 */
export function calibrationStanding(dueOn: string, today: string): { standing: 'past' | 'soon' | 'ahead'; daysLeft: number } {
  const daysLeft = toDayNumber(dueOn) - toDayNumber(today)
  return { standing: daysLeft < 0 ? 'past' : daysLeft <= SOON_DAYS ? 'soon' : 'ahead', daysLeft }
}
