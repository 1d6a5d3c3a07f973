import { beforeEach, describe, expect, it, vi } from 'vitest'
import { useInviteForm } from '../../../../src/composables/people/useInviteForm.ts'
import { inSetup, laterAnswer, refusalOf } from './inSetup.ts'

const submit = vi.fn()
vi.mock('../../../../src/composables/form/useSubmit.ts', () => ({ useSubmit: () => ({ submit }) }))
beforeEach(() => { submit.mockReset() })

const begun = () => {
  const form = inSetup(() => useInviteForm(() => 'f1'))
  form.begin()
  return form
}
const found = (errors: Record<string, string>): string[] => Object.keys(errors).filter((name) => errors[name] !== '').sort()

describe('inviting somebody', () => {
  it('asks for an address, and for the password only where the role leads', async () => {
    const form = begun()
    expect(await form.save()).toBeNull()
    expect(found(form.errors)).toEqual(['email'])
    form.draft.role = 'manager'
    await form.save()
    expect(found(form.errors)).toEqual(['email', 'password'])
    form.draft.email = 'nobody'
    form.draft.password = 'a long password'
    await form.save()
    expect(found(form.errors)).toEqual(['email'])
    expect(submit).not.toHaveBeenCalled()
  })

  it('sends no password with a role that needs none, though one was typed', async () => {
    submit.mockResolvedValue({ state: 'sent', answer: {} })
    const form = begun()
    Object.assign(form.draft, { email: 'ana@farm.example', name: ' Ana ', role: 'manager', password: 'a long password' })
    form.draft.role = 'applicator'
    expect(await form.save()).toBe('sent')
    const [command] = submit.mock.calls[0] as [{ kind: string; farmId: string; id: string; body: object }]
    expect(command).toEqual({ kind: 'invitation.create', farmId: 'f1', id: command.id, body: { id: command.id, email: 'ana@farm.example', name: 'Ana', role: 'applicator', language: 'en' } })
  })

  it('sends once for two presses, says a refusal at its field, and keeps the id for the next try', async () => {
    const form = begun()
    form.draft.email = 'ana@farm.example'
    submit.mockRejectedValueOnce(refusalOf('email', 'Already on this farm.'))
    await form.save()
    expect([form.errors['email'], form.refusal.value]).toEqual(['Already on this farm.', ''])
    const slow = laterAnswer({ state: 'kept' })
    submit.mockReturnValueOnce(slow.promise)
    const presses = [form.save(), form.save()]
    slow.come()
    expect(await Promise.all(presses)).toEqual(['kept', null])
    expect(new Set(submit.mock.calls.map(([{ id }]) => id as string)).size).toBe(1)
    expect(submit).toHaveBeenCalledTimes(2)
    expect(found(form.errors)).toEqual([])
  })
})
