import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { Person } from '../../../../shared/contract/person.ts'
import { deedsFor, usePersonDeed, type PersonDeed } from '../../../../src/composables/people/usePersonDeed.ts'
import { inSetup, laterAnswer, refusalOf } from './inSetup.ts'

const submit = vi.fn()
vi.mock('../../../../src/composables/form/useSubmit.ts', () => ({ useSubmit: () => ({ submit }) }))
beforeEach(() => { submit.mockReset() })

const PERSON: Person = { id: 'p1', name: 'Ruan Teal', role: 'applicator', email: null, active: true, signsWith: 'pin', hasFactor: false, revision: 3 }
function formOf(deed: PersonDeed, person = PERSON) {
  const form = inSetup(() => usePersonDeed(() => 'f1', () => person, () => deed))
  form.proof.begin()
  form.proof.password.value = 'a long password'
  return form
}

describe('what can be done about a person', () => {
  it.each<[string, Partial<Person>, string | null, PersonDeed[]]>([
    ['somebody with a PIN', {}, 'p9', ['change', 'letGo', 'pin', 'sessions']],
    ['a manager with a second factor', { role: 'manager', signsWith: 'password', hasFactor: true }, 'p9', ['change', 'letGo', 'sessions', 'factor']],
    ['somebody who was let go', { active: false, signsWith: null }, 'p9', ['change', 'takeBack']],
    ['oneself: nobody shuts themselves out', { role: 'owner', signsWith: 'password', hasFactor: true }, 'p1', ['change']],
  ])('%s', (_who, changes, ownId, deeds) => {
    expect(deedsFor({ ...PERSON, ...changes }, ownId)).toEqual(deeds)
  })

  it.each<[PersonDeed, string, object]>([
    ['change', 'person.change', { revision: 3, name: 'Ruan Teal', role: 'applicator' }],
    ['letGo', 'person.change', { revision: 3, active: false }],
    ['takeBack', 'person.change', { revision: 3, active: true }],
    ['pin', 'person.pin', { revision: 3, pin: '' }],
    ['sessions', 'person.endSessions', {}],
    ['factor', 'person.resetFactor', {}],
  ])('%s sends its own command and no more', async (deed, kind, body) => {
    submit.mockResolvedValue({ state: 'sent', answer: {} })
    expect(await formOf(deed).proof.run()).toBe(true)
    expect(submit.mock.calls).toEqual([[{ kind, farmId: 'f1', id: 'p1', body: { ...body, password: 'a long password' } }]])
  })

  it('says a refusal at its field, and above the form where it has none', async () => {
    const form = formOf('pin')
    submit.mockRejectedValueOnce(refusalOf('pin', 'Six figures.')).mockRejectedValueOnce(refusalOf('active', 'The last owner stays.'))
    expect(await form.proof.run()).toBe(false)
    expect([form.proof.errors.value['pin'], form.proof.refusal.value]).toEqual(['Six figures.', ''])
    expect(await form.proof.run()).toBe(false)
    expect(form.proof.refusal.value).toBe('The last owner stays.')
  })

  it('is sent once for two presses, and the password is gone when it is opened again', async () => {
    const slow = laterAnswer({ state: 'sent', answer: {} })
    submit.mockReturnValueOnce(slow.promise)
    const form = formOf('letGo')
    const presses = [form.proof.run(), form.proof.run()]
    slow.come()
    expect(await Promise.all(presses)).toEqual([true, false])
    expect(submit).toHaveBeenCalledTimes(1)
    form.proof.begin()
    expect(form.proof.password.value).toBe('')
  })
})
