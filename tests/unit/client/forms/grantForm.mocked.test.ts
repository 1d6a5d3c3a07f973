import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { Grant } from '../../../../shared/contract/grant.ts'
import { useGrantForm } from '../../../../src/composables/farm/useGrantForm.ts'
import { inSetup, laterAnswer, refusalOf } from './inSetup.ts'

const submit = vi.fn()
vi.mock('../../../../src/composables/form/useSubmit.ts', () => ({ useSubmit: () => ({ submit }) }))
beforeEach(() => { submit.mockReset() })

const GRANT: Grant = {
  id: '01990000-0000-7000-8000-000000000001', email: 'reader@review.example', organisation: 'Oaklode Review', seasons: [2026], endsOn: '2026-12-31', endedAt: null, stands: true,
  givenBy: 'Hesper Quill', createdAt: '2026-03-01T10:00:00.000Z', lastTaken: null, revision: 4,
}
const filled = () => {
  const form = inSetup(useGrantForm)
  form.begin(null, { seasons: [2026], endsOn: '2027-01-31' })
  Object.assign(form.draft.value, { certifierEmail: 'reader@review.example', organisation: 'Oaklode Review', password: 'a long password' })
  return form
}

describe('giving a grant', () => {
  it('says at each field what is missing, and sends nothing', async () => {
    const form = inSetup(useGrantForm)
    form.begin(null, { seasons: [], endsOn: null })
    expect(await form.save()).toBeUndefined()
    expect(Object.keys(form.errors.value).sort()).toEqual(['certifierEmail', 'endsOn', 'organisation', 'password', 'seasons'])
    for (const sentence of Object.values(form.errors.value)) expect(sentence).toMatch(/^\p{L}.+\.$/u)
    expect(submit).not.toHaveBeenCalled()
  })

  it('sends it once however often it is pressed, and under the same id when it is tried again', async () => {
    const form = filled()
    const slow = laterAnswer({ state: 'sent', answer: GRANT })
    submit.mockRejectedValueOnce(refusalOf('certifierEmail', 'Somebody who works here.')).mockReturnValueOnce(slow.promise)
    await form.save()
    expect([form.errors.value, form.failure.value]).toEqual([{ certifierEmail: 'Somebody who works here.' }, ''])
    const presses = [form.save(), form.save()]
    slow.come()
    expect(await Promise.all(presses)).toEqual([GRANT, undefined])
    expect(submit).toHaveBeenCalledTimes(2)
    const [first, second] = submit.mock.calls.map(([command]) => command)
    expect(second).toEqual(first)
    expect(second).toMatchObject({ kind: 'grant.give', body: { id: second.id, certifierEmail: 'reader@review.example', organisation: 'Oaklode Review', seasons: [2026], endsOn: '2027-01-31', password: 'a long password' } })
  })

  it('gives the next one another id', async () => {
    submit.mockResolvedValue({ state: 'sent', answer: GRANT })
    const form = filled()
    await form.save()
    form.begin(null, { seasons: [2026], endsOn: '2027-01-31' })
    expect(form.draft.value.password).toBe('')
    Object.assign(form.draft.value, { certifierEmail: 'b@review.example', organisation: 'Other', password: 'a long password' })
    await form.save()
    expect(submit.mock.calls[1]?.[0].id).not.toBe(submit.mock.calls[0]?.[0].id)
  })
})

describe('changing and ending one', () => {
  it('sends the revision that was seen and no e-mail', async () => {
    submit.mockResolvedValue({ state: 'sent', answer: GRANT })
    const form = inSetup(useGrantForm)
    form.begin(GRANT, { seasons: [], endsOn: null })
    form.draft.value.password = 'a long password'
    await form.save()
    expect(submit.mock.calls[0]?.[0]).toMatchObject({ kind: 'grant.change', id: GRANT.id, body: { revision: 4, organisation: 'Oaklode Review', seasons: [2026], endsOn: '2026-12-31', password: 'a long password' } })
    expect(submit.mock.calls[0]?.[0].body).not.toHaveProperty('certifierEmail')
  })

  it('ends it with the password alone, and not without', async () => {
    submit.mockResolvedValue({ state: 'sent', answer: GRANT })
    const form = inSetup(useGrantForm)
    form.begin(GRANT, { seasons: [], endsOn: null })
    await form.end(GRANT)
    expect(Object.keys(form.errors.value)).toEqual(['password'])
    form.draft.value.password = 'a long password'
    await form.end(GRANT)
    expect(submit.mock.calls.map(([command]) => command)).toMatchObject([{ kind: 'grant.end', id: GRANT.id, body: { revision: 4, password: 'a long password' } }])
  })
})
