import type { Check } from '../../../shared/contract/record.ts'
import { clockSkewMinutes } from '../../../shared/records/clockSkewMinutes.ts'
import { roundDecimal } from '../../../shared/units/roundDecimal.ts'
import type { FieldError } from '../../errors.ts'

/** So many times over the label's most, a unit or a decimal mark was mixed up. */
const SUSPECT_TIMES = 10
const LABEL_CODES = new Set(['label.rate', 'label.strength'])
/** A day, minutes. */
const BEHIND = 24 * 60

/** Components so far over what their label allows that a unit looks mixed up. A reason for the stop does not answer for it. */
export function findSuspectDoses(checks: readonly Check[]): FieldError[] {
  return checks.flatMap(({ code, verdict, band, about }) => {
    if (verdict !== 'stop' || !LABEL_CODES.has(code) || !band?.high || band.value <= band.high * SUSPECT_TIMES) return []
    return [{ path: about ?? '', code: 'dose.unit_suspect', params: { times: Number(roundDecimal(String(band.value / band.high), 1)) } }]
  })
}

/** A device that was more than a day behind proposed days of its own; one that was ahead betrays itself by times in the future. */
export function findClockDoubts({ deviceAt, receivedAt }: { deviceAt: Date | null; receivedAt: Date }): FieldError[] {
  const skew = clockSkewMinutes(deviceAt, receivedAt)
  if (skew === null || skew >= -BEHIND) return []
  return [{ path: 'lines', code: 'time.device_clock', params: { days: Math.floor(-skew / BEHIND) } }]
}
