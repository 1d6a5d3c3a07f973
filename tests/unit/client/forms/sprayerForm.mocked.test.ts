import { beforeEach, describe, expect, it, vi } from 'vitest'
import { useSprayerForm } from '../../../../src/composables/farm/useSprayerForm.ts'
import { inSetup, laterAnswer } from './inSetup.ts'

const submit = vi.fn()
vi.mock('../../../../src/composables/form/useSubmit.ts', () => ({ useSubmit: () => ({ submit }) }))
beforeEach(() => { submit.mockReset() })

const filled = (draft: object) => {
  const form = inSetup(() => useSprayerForm(() => 'f1'))
  form.begin()
  Object.assign(form.draft, draft)
  return form
}
const found = (errors: Record<string, string>): string[] => Object.keys(errors).filter((name) => errors[name] !== '').sort()

describe('a new sprayer', () => {
  it.each([
    [{ code: '', name: '', tankL: '' }, ['code', 'name', 'tankL']],
    [{ code: 'M2', name: 'Mist sprayer', tankL: 'four hundred' }, ['tankL']],
    [{ code: 'M2', name: 'Mist sprayer', tankL: '0' }, ['tankL']],
    [{ code: 'M2', name: 'Mist sprayer', tankL: '-400' }, ['tankL']],
  ])('is not sent as %j', async (draft, fields) => {
    const form = filled(draft)
    expect(await form.save()).toBeNull()
    expect(found(form.errors)).toEqual(fields)
    expect(submit).not.toHaveBeenCalled()
  })

  it.each([['400', '400'], ['400,5', '400.5'], ['400.5', '400.5']])('reads a tank of %s as %s litres', async (typed, tankL) => {
    submit.mockResolvedValue({ state: 'sent', answer: {} })
    await filled({ code: 'M2', name: 'Mist sprayer', tankL: typed }).save()
    expect(submit.mock.calls[0]?.[0]).toMatchObject({ kind: 'sprayer.create', farmId: 'f1', body: { code: 'M2', name: 'Mist sprayer', tankL } })
  })

  it('is sent once for two presses, and empties for the next one, under another id', async () => {
    const slow = laterAnswer({ state: 'sent', answer: {} })
    submit.mockReturnValueOnce(slow.promise).mockResolvedValueOnce({ state: 'sent', answer: {} })
    const form = filled({ code: 'M2', name: 'Mist sprayer', tankL: '400' })
    const presses = [form.save(), form.save()]
    slow.come()
    expect(await Promise.all(presses)).toEqual(['sent', null])
    form.begin()
    expect(form.draft).toEqual({ code: '', name: '', tankL: '' })
    Object.assign(form.draft, { code: 'K1', name: 'Knapsack', tankL: '15' })
    await form.save()
    expect(submit).toHaveBeenCalledTimes(2)
    expect(submit.mock.calls[1]?.[0].id).not.toBe(submit.mock.calls[0]?.[0].id)
  })
})
