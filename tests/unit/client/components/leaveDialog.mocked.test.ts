import { flushPromises } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { afterEach, beforeEach, expect, it, vi } from 'vitest'
import { NetworkError } from '../../../../src/api/errors.ts'
import type { KeptCommand } from '../../../../src/stores/keptCommand.ts'
import { useOutbox } from '../../../../src/stores/outbox.ts'
import { useSession } from '../../../../src/stores/session.ts'
import LeaveDialog from '../../../../src/views/frame/LeaveDialog.vue'
import { say } from '../../../e2e/support/words.ts'
import { buildUser } from '../buildUser.ts'
import { MemoryTable } from '../memoryTable.ts'
import { mountWithWords } from '../mountWithWords.ts'

const here = vi.hoisted(() => ({ device: {} as { outbox: unknown; reads: unknown; files: unknown }, send: vi.fn(), signOut: vi.fn() }))
vi.mock('../../../../src/plugins/device.ts', () => ({ device: here.device }))
vi.mock('../../../../src/api/commandApi.ts', () => ({ sendCommand: here.send }))
// The frame of a dialog is read later, by the browser; what stands in it is looked at here.
vi.mock('../../../../src/components/app/AppDialog.vue', () => ({
  default: { props: ['open', 'title'], template: '<section v-if="open"><h2>{{ title }}</h2><slot /><slot name="actions" /></section>' },
}))
vi.mock('../../../../src/api/sessionApi.ts', () => ({ sessionApi: { signOut: here.signOut } }))

let outbox: MemoryTable<KeptCommand>

beforeEach(() => {
  outbox = new MemoryTable<KeptCommand>('key')
  Object.assign(here.device, { outbox, reads: new MemoryTable<{ key: string }>('key'), files: new MemoryTable<{ id: string }>('id') })
  here.signOut.mockReset()
  setActivePinia(createPinia())
  useSession().accept({ user: buildUser({ id: 'oda' }), memberships: [] })
})
afterEach(() => { document.body.replaceChildren() })

async function askToLeave() {
  const dialog = mountWithWords(LeaveDialog, { open: false })
  await dialog.setProps({ open: true })
  await flushPromises()
  return dialog
}

it('signs out at once where nothing waits', async () => {
  const dialog = await askToLeave()
  expect(here.signOut).toHaveBeenCalledOnce()
  expect(dialog.emitted('left')).toHaveLength(1)
})

it('7.4.4: says first what stays on this device where something waits, and sends nobody away by itself', async () => {
  here.send.mockRejectedValue(new NetworkError('no signal'))
  await useOutbox().submit({ kind: 'sprayer.create', farmId: 'f', id: 's1', body: { id: 's1', code: 's1', name: 'Knapsack', tankL: '15' } }).catch(() => undefined)
  const dialog = await askToLeave()
  expect(here.signOut).not.toHaveBeenCalled()
  expect(document.body.textContent).toContain(say('frame.leave.title'))
  const buttons = [...document.body.querySelectorAll('button')]
  buttons.find(({ textContent }) => textContent.includes(say('frame.moreSheet.signOut')))?.click()
  await flushPromises()
  expect(here.signOut).toHaveBeenCalledOnce()
  expect(dialog.emitted('left')).toHaveLength(1)
  expect(await outbox.all()).toHaveLength(1)
})
