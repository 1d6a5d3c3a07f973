import { buildCheck } from '../../../shared/checks/buildCheck.ts'
import type { Farm, Sprayer } from '../../../shared/contract/farm.ts'
import type { Check } from '../../../shared/contract/record.ts'
import type { Message } from '../../../shared/contract/common.ts'
import { certificateRuns, certifiedUntil } from '../../../shared/season/certificateRuns.ts'
import { calibrationStanding } from '../../../shared/mix/calibrationStanding.ts'

const message = (id: string, params: Message['params'] = {}): Message => ({ id, params })

interface DayWords { dayOf: (civilDate: string) => string; rates: (rateLPerHa: string) => [string, string] }

/** What is in force on a farm, and what nobody has set: not known is not a pass. @param ruleTitle words of a rule set. */
export function farmChecks(farm: Farm, sprayers: readonly Sprayer[] | undefined, today: string, words: DayWords & { ruleTitle: (rules: string) => string }): Check[] {
  const named = farm.ruleSets.map(words.ruleTitle).join(', ')
  const law = buildCheck({
    code: 'farm.no_rules', verdict: 'unknown', rests: 'law', title: message('profile.checks.rules.title'),
    text: named === '' ? message('farm.checks.law.text') : message('profile.checks.rules.text', { rules: named }),
  })
  const used = sprayers?.filter(({ retired }) => retired === null)
  const noSprayer = buildCheck({ code: 'farm.no_sprayer', verdict: 'caution', rests: 'house', title: message('farm.checks.sprayer.title'), text: message('farm.checks.sprayer.text') })
  return [law, certificateCheck(farm, today, words), ...(used?.length === 0 ? [noSprayer] : []), ...(used ?? []).map((sprayer) => sprayerCheck(sprayer, today, words))]
}

function certificateCheck({ certificates }: Farm, today: string, { dayOf }: DayWords): Check {
  const base = { code: 'farm.certificate', rests: 'certifier', title: message('profile.checks.certificate.title') } as const
  const unknown = (text: Message): Check => buildCheck({ ...base, verdict: 'unknown', text })
  const held = certifiedUntil(certificates, today)
  if (held === null) {
    const [first] = certificateRuns(certificates)
    if (first?.from == null) return unknown(message('profile.checks.certificate.none'))
    return unknown(message('profile.checks.certificate.begins', { number: first.certificate.number, day: dayOf(first.from) }))
  }
  if (held.expiresOn === null) return unknown(message('profile.checks.certificate.open'))
  const { standing, daysLeft } = calibrationStanding(held.expiresOn, today)
  const said = { past: 'ended', soon: 'soon', ahead: 'valid' } as const
  return buildCheck({ ...base, verdict: standing === 'ahead' ? 'pass' : 'caution', text: message(`profile.checks.certificate.${said[standing]}`, { day: dayOf(held.expiresOn), days: daysLeft }) })
}

/** How the calibration of one sprayer stands. */
export function sprayerCheck({ code, calibration }: Sprayer, today: string, { dayOf, rates }: DayWords): Check {
  const base = { code: `farm.calibration.${code}`, rests: 'house', title: message('sprayers.checks.title') } as const
  if (calibration === null) return buildCheck({ ...base, verdict: 'unknown', text: message('sprayers.checks.none.text', { code }) })
  const { standing, daysLeft } = calibrationStanding(calibration.dueOn, today)
  const params = { code, on: dayOf(calibration.on), due: dayOf(calibration.dueOn), days: daysLeft, rate: rates(calibration.rateLPerHa)[0] }
  return buildCheck({ ...base, verdict: standing === 'ahead' ? 'pass' : 'caution', text: message(`sprayers.checks.${standing}.text`, params) })
}
