import { flushPromises } from '@vue/test-utils'
import { afterEach, describe, expect, it, vi } from 'vitest'
import RecordFiles from '../../../../src/components/files/RecordFiles.vue'
import type { FileLine } from '../../../../src/composables/files/fileLine.ts'
import { mountWithWords } from '../mountWithWords.ts'

const line = (overrides: Partial<FileLine> = {}): FileLine => ({
  id: 'a', kind: 'photo', label: 'rows.jpg', what: 'Photo, 1.2 MB', who: 'Tam Lisk, Tue 16 Jun, 07:12', isPdf: false, picture: '/small', shown: '/shown',
  original: '', mark: '', state: 'there', percent: 100, problem: '', mayRemove: true, ...overrides,
})
const props = (overrides: Record<string, unknown> = {}) => ({ lines: [], faults: [], said: '', listFault: '', canAdd: true, ...overrides })

afterEach(() => { document.body.innerHTML = '' })

describe('RecordFiles', () => {
  it('gives chosen files with their kind, and takes the same file twice', async () => {
    const parts = mountWithWords(RecordFiles, props())
    const input = parts.get('[data-add="paper"]')
    const file = new File(['x'], 'receipt.pdf', { type: 'application/pdf' })
    for (let times = 0; times < 2; times += 1) {
      Object.defineProperty(input.element, 'files', { value: [file], configurable: true })
      await input.trigger('change')
    }
    expect(parts.findComponent(RecordFiles).emitted('add')).toEqual([['paper', [file]], ['paper', [file]]])
    expect(input.attributes('accept')).toBe('image/jpeg,image/png,image/webp,application/pdf')
  })

  it('says what stands beside a file, and asks before it is taken back', async () => {
    const parts = mountWithWords(RecordFiles, props({ lines: [line({ mark: 'Added after the signature' })] }))
    expect(parts.text()).toContain('Added after the signature')
    expect(parts.text()).toContain('Photo, 1.2 MB · Tam Lisk, Tue 16 Jun, 07:12')
    await parts.get('button[aria-label="Take back rows.jpg"]').trigger('click')
    expect(parts.emitted('remove')).toBeUndefined()
    // The dialog itself is read when it is first shown.
    await vi.dynamicImportSettled()
    await flushPromises()
    const sure = [...document.body.querySelectorAll('button')].find(({ textContent }) => textContent?.trim() === 'Yes, take it back')
    sure?.click()
    expect(parts.emitted('remove')).toMatchObject([[{ id: 'a' }]])
  })

  it('shows how far one is, why one waits or was refused, and sends it again', async () => {
    const lines = [line({ id: 's', state: 'sending', percent: 40 }), line({ id: 'r', label: 'big.jpg', state: 'refused', problem: 'This picture is damaged.' })]
    const parts = mountWithWords(RecordFiles, props({ lines }))
    expect(parts.get('progress').attributes()).toMatchObject({ value: '40', 'aria-label': 'Sending rows.jpg' })
    expect(parts.text()).toContain('This picture is damaged.')
    await parts.get('button[aria-label="Send big.jpg again"]').trigger('click')
    expect(parts.emitted('retry')).toEqual([['r']])
  })

  it('offers a reader nothing to change, and says when there is none', () => {
    const parts = mountWithWords(RecordFiles, props({ canAdd: false }))
    expect(parts.text()).toContain('No photos or papers.')
    expect(parts.findAll('button')).toEqual([])
    const full = mountWithWords(RecordFiles, props({ canAdd: false, lines: [line()] }))
    expect(full.find('button[aria-label^="Take back"]').exists()).toBe(false)
  })

  it('speaks faults at once', () => {
    const parts = mountWithWords(RecordFiles, props({ faults: ['a.heic: choose JPEG'] }))
    expect(parts.get('[role="alert"]').text()).toBe('a.heic: choose JPEG')
  })
})
