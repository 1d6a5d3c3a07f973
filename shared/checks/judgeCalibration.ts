import type { Check } from '../contract/record.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import { buildCheck, words } from './buildCheck.ts'
import type { RecordFacts } from './recordFacts.ts'
import { roundForReader } from './roundForReader.ts'

/** A rate so far from what was measured, percent, asks for a look: the same band as for a worn nozzle. */
const APART_PERCENT = 10

/**
 * The rate a leaf spray is planned at, or went on the land at once every line says so, beside the rate its sprayer was last measured
 * at. Both figures stand in the check, and so in the signed text. A drench is poured, not driven, and has none.
 * @param usedOn `dayOfUse`. @returns null where no sprayer is chosen or no rate is known yet.
 * @source house rule: 10 %, as for a nozzle (F1.13); due dates are the farm's own.
 */
export function judgeCalibration(facts: RecordFacts, usedOn: string): Check | null {
  const { sprayer, sheet, content } = facts
  if (content.method !== 'foliar' || sprayer === null || sheet.sprayLPerHa === null) return null
  const { code, calibration } = sprayer
  const base = { code: 'house.calibration', rests: 'house', title: words('checks.calibration.title', { code }), about: 'sprayer' } as const
  if (calibration === null || calibration.on > usedOn) return buildCheck({ ...base, verdict: 'unknown', text: words('checks.calibration.none', { code }) })
  const onLand = sheet.appliedL !== null && sheet.areaHa > 0 ? new ExactDecimal(sheet.appliedL).div(sheet.areaHa) : null
  const sprayed = onLand ?? new ExactDecimal(sheet.sprayLPerHa)
  const apart = sprayed.div(calibration.rateLPerHa).minus(1).times(100).toDecimalPlaces(1)
  const isOff = apart.abs().gte(APART_PERCENT)
  const isPast = calibration.dueOn < usedOn
  const said = isOff ? 'off' : isPast ? 'past' : 'within'
  return buildCheck({
    ...base,
    verdict: isOff || isPast ? 'caution' : 'pass',
    text: words(`checks.calibration.${said}${onLand === null ? '' : 'OnLand'}`, {
      planned: roundForReader(sprayed.toNumber()), rate: roundForReader(calibration.rateLPerHa), unit: 'L/ha', doneOn: calibration.on, dueOn: calibration.dueOn, apart: apart.abs().toNumber(),
    }),
    figure: words('checks.figure.percent', { value: `${apart.gt(0) ? '+' : ''}${apart.toString()}` }),
  })
}
