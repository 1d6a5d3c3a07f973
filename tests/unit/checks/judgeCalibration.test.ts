import { describe, expect, it } from 'vitest'
import { dayOfUse } from '../../../shared/checks/dayOfUse.ts'
import { judgeCalibration } from '../../../shared/checks/judgeCalibration.ts'
import type { RecordFacts } from '../../../shared/checks/recordFacts.ts'
import { buildFacts } from './buildFacts.ts'

const MEASURED = { id: 'c', on: '2026-05-01', dueOn: '2027-05-01', rateLPerHa: '400' }
const facts = (sprayLPerHa: number | null, calibration: typeof MEASURED | null = MEASURED) => {
  const built = buildFacts()
  return { ...built, sheet: { ...built.sheet, sprayLPerHa }, sprayer: { code: 'M2', calibration } }
}
const judge = (given: RecordFacts) => judgeCalibration(given, dayOfUse(given))

describe('the rate beside the calibrated one', () => {
  it.each([
    [400, 'pass', '0'], [439, 'pass', '+9.8'], [440, 'caution', '+10'], [360, 'caution', '-10'], [361, 'pass', '-9.8'], [500, 'caution', '+25'],
  ])('%d L/ha beside 400 is %s', (planned, verdict, figure) => {
    expect(judge(facts(planned))).toMatchObject({ verdict, figure: { params: { value: figure } } })
  })

  it('is judged by what went on the land, once every line says it', () => {
    const planned = facts(400)
    const onLand = (appliedL: string | null) => judge({ ...planned, sheet: { ...planned.sheet, areaHa: 2, appliedL } })
    expect(onLand(null)).toMatchObject({ verdict: 'pass', text: { id: 'checks.calibration.within', params: { planned: 400 } } })
    // 600 L on 2 ha are 300 L/ha, a quarter under 400.
    expect(onLand('600')).toMatchObject({ verdict: 'caution', text: { id: 'checks.calibration.offOnLand', params: { planned: 300, apart: 25 } }, figure: { params: { value: '-25' } } })
    expect(onLand('800')).toMatchObject({ verdict: 'pass', text: { id: 'checks.calibration.withinOnLand' } })
  })

  it('is not known before the first calibration, and before it was made', () => {
    expect(judge(facts(400, null))).toMatchObject({ verdict: 'unknown', figure: null })
    expect(judge(facts(400, { ...MEASURED, on: '2099-01-01' }))).toMatchObject({ verdict: 'unknown' })
  })

  it('cautions when the next calibration was due', () => {
    expect(judge(facts(400, { ...MEASURED, dueOn: '2026-05-31' }))).toMatchObject({ verdict: 'caution', text: { id: 'checks.calibration.past' } })
  })

  it('is not asked of a drench, without a sprayer, or before a rate is known', () => {
    const foliar = facts(400)
    expect(judge({ ...foliar, content: { ...foliar.content, method: 'drench' } })).toBeNull()
    expect(judge({ ...foliar, sprayer: null })).toBeNull()
    expect(judge(facts(null))).toBeNull()
  })
})
