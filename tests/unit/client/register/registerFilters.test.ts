import { flushPromises, mount } from '@vue/test-utils'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import RegisterFiles from '../../../../src/components/register/RegisterFiles.vue'
import RegisterFilters from '../../../../src/components/register/RegisterFilters.vue'
import { i18n } from '../../../../src/plugins/i18n.ts'

const global = { plugins: [i18n] }
const mountFilters = (filter = {}) => mount(RegisterFilters, { global, props: { filter, options: { method: [{ value: 'drench', label: 'Soil drench' }] } }, attachTo: document.body })

beforeEach(() => { i18n.global.locale.value = 'en' })

describe('RegisterFilters', () => {
  it('searches for words when they are sent off, and keeps what else is chosen', async () => {
    const filters = mountFilters({ method: 'drench' })
    await filters.get('input[name="q"]').setValue(' nettle  bank ')
    await filters.get('form').trigger('submit')
    expect(filters.emitted('change')).toEqual([[{ method: 'drench', q: 'nettle  bank' }]])
  })

  it('forgets the words when they are emptied', async () => {
    const filters = mountFilters({ q: 'nettle' })
    await filters.get('input[name="q"]').setValue('')
    await filters.get('form').trigger('submit')
    expect(filters.emitted('change')).toEqual([[{}]])
  })

  it('says what cannot be searched for and asks for nothing', async () => {
    const filters = mountFilters()
    await filters.get('input[name="q"]').setValue('--')
    await filters.get('form').trigger('submit')
    expect(filters.emitted('change')).toBeUndefined()
    expect(filters.get('[role="alert"]').text()).toContain('8 words')
  })

  it('shows only what this reader may choose by', () => {
    const text = mountFilters().text()
    expect(text).toContain('How')
    expect(text).not.toContain('Done by')
  })
})

describe('RegisterFiles', () => {
  it('offers each volume where there are several', async () => {
    mount(RegisterFiles, { global, props: { open: true, what: '9 000 records', csvHref: '/csv', pdfHrefs: ['/pdf?volume=1', '/pdf?volume=2'], reading: false }, attachTo: document.body })
    // The dialog itself is read when it is first shown.
    await vi.dynamicImportSettled()
    await flushPromises()
    const links = [...document.querySelectorAll('a.take')].map((link) => [link.getAttribute('href'), link.textContent.trim()])
    expect(links).toEqual([['/csv', 'CSV for a spreadsheet'], ['/pdf?volume=1', 'Volume 1 of 2'], ['/pdf?volume=2', 'Volume 2 of 2']])
  })
})
