import { beforeEach, describe, expect, it, vi } from 'vitest'
import { createCalibrationSchema } from '../../../../shared/contract/calibration.ts'
import { bodyOfCalibration, newCalibration, type CalibrationDraft } from '../../../../src/composables/farm/calibrationDraft.ts'
import { useInputForm } from '../../../../src/composables/form/useInputForm.ts'
import { inSetup, laterAnswer } from './inSetup.ts'

const submit = vi.fn()
vi.mock('../../../../src/composables/form/useSubmit.ts', () => ({ useSubmit: () => ({ submit }) }))
beforeEach(() => { submit.mockReset() })

const SPRAYER = '01990000-0000-7000-8000-00000000000a'
const FITTING = { kind: 'boom', swathM: '12', nozzle: null, nozzles: 24, screenMesh: null, pressureBar: null, speedKmH: '6' } as const
const base = newCalibration({ fitting: FITTING, flowLPerMin: null } as unknown as Parameters<typeof newCalibration>[0], '2026-06-16', 'Oda Verrill')
function formOf(changes: Partial<CalibrationDraft>) {
  const draft: CalibrationDraft = { ...base, ...changes }
  return inSetup(() => useInputForm({ kind: 'calibration.create', schema: createCalibrationSchema, body: (id) => bodyOfCalibration(draft, { id, sprayerId: SPRAYER }), done: () => 'done' }))
}
const CATCH: Partial<CalibrationDraft> = { kind: 'catch', seconds: '30', catches: '410; 395 400,5' }

describe('a calibration', () => {
  it('begins with what is fitted', () => {
    expect(base).toMatchObject({ kind: 'catch', on: '2026-06-16', doneBy: 'Oda Verrill', nozzles: '24', swathM: '12', speedKmH: '6' })
  })

  it.each<[string, Partial<CalibrationDraft>, string[]]>([
    ['no catch', { ...CATCH, catches: ' ' }, ['measured.catchesMl']],
    ['a catch that is no figure', { ...CATCH, catches: '410 many' }, ['measured.catchesMl.1']],
    ['no width and no speed', { ...CATCH, swathM: '', speedKmH: '' }, ['measured.swathM', 'measured.speedKmH']],
    ['no day', { ...CATCH, on: null }, ['on']],
    ['an empty plot', { kind: 'plot', volumeL: '0', areaM2: '100' }, ['measured.volumeL']],
  ])('is not sent with %s', async (_what, changes, fields) => {
    const form = formOf(changes)
    expect(await form.save()).toBe(false)
    expect(Object.keys(form.errors.value).sort()).toEqual([...fields].sort())
    expect(submit).not.toHaveBeenCalled()
  })

  it('sends each way of measuring with its own figures and none of the others', async () => {
    submit.mockResolvedValue({ state: 'sent', answer: {} })
    const measured = async (changes: Partial<CalibrationDraft>): Promise<object> => {
      await formOf(changes).save()
      return (submit.mock.calls.at(-1)?.[0] as { body: { measured: object } }).body.measured
    }
    expect(await measured(CATCH)).toEqual({ kind: 'catch', swathM: '12', speedKmH: '6', seconds: '30', nozzles: 24, catchesMl: ['410', '395', '400.5'] })
    expect(await measured({ kind: 'flow', flow: '9,6' })).toEqual({ kind: 'flow', swathM: '12', speedKmH: '6', flowLPerMin: '9.6' })
    expect(await measured({ kind: 'course', widthIn: '20', ounces: '30' })).toEqual({ kind: 'course', widthIn: '20', ounces: '30' })
    expect(await measured({ kind: 'plot', volumeL: '4.2', areaM2: '100' })).toEqual({ kind: 'plot', volumeL: '4.2', areaM2: '100' })
  })

  it('is sent once for two presses', async () => {
    const slow = laterAnswer({ state: 'sent', answer: {} })
    submit.mockReturnValueOnce(slow.promise)
    const form = formOf(CATCH)
    const presses = [form.save(), form.save()]
    slow.come()
    expect(await Promise.all(presses)).toEqual([true, false])
    expect(submit).toHaveBeenCalledTimes(1)
  })
})
