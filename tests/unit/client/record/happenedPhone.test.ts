import { mount } from '@vue/test-utils'
import { createPinia } from 'pinia'
import { describe, expect, it } from 'vitest'
import { ref } from 'vue'
import { recordSheet } from '../../../../shared/mix/recordSheet.ts'
import HappenedPhone from '../../../../src/components/record/HappenedPhone.vue'
import { emptyLine } from '../../../../src/composables/record/lineDraft.ts'
import { sheetInputOf } from '../../../../src/composables/record/recordContent.ts'
import type { RecordDraft } from '../../../../src/composables/record/recordDraft.ts'
import { useLineRows } from '../../../../src/composables/record/useLineRows.ts'
import { i18n } from '../../../../src/plugins/i18n.ts'
import { inSetup } from '../forms/inSetup.ts'
import { buildBlock, buildDraft, buildLine } from './buildRecord.ts'

const blocks = [buildBlock(), buildBlock({ id: 'b2', code: 'A2' })]
const stock = { farmId: 'f1', farm: null, blocks, materials: [], lots: [], sprayers: [], people: [] }

function shown(lines: RecordDraft['lines']) {
  const draft = ref(buildDraft({ step: 2, lines }))
  const sheet = ref(recordSheet(sheetInputOf(draft.value, { blocks, sprayer: null })))
  const rows = inSetup(() => useLineRows({ draft, sheet, stock: ref(stock), zone: ref('UTC'), errors: ref({}) }))
  const wrapper = mount(HappenedPhone, { props: { modelValue: draft.value, rows: rows.value, sheet: sheet.value, zone: 'UTC', asked: [] }, global: { plugins: [createPinia(), i18n] } })
  const press = async (code: string): Promise<void> => {
    await wrapper.findAll('button.row').find((row) => row.text().startsWith(code))?.trigger('click')
    await wrapper.get('.next').trigger('click')
    await wrapper.setProps({ rows: rows.value })
  }
  return { draft, wrapper, press }
}

describe('the next block, on a phone', () => {
  it('begins where the one before ended, and stands open', async () => {
    const { draft, wrapper, press } = shown([buildLine({ end: { time: '00:10', offset: '', nextDay: true } }), emptyLine('b2')])
    await press('A3')
    expect(draft.value.lines[1]?.start).toEqual({ date: '2026-06-17', time: '00:10', offset: '' })
    expect(wrapper.findAll('button.row').map((row) => row.attributes('aria-expanded'))).toEqual(['false', 'true'])
  })

  it('is not ended by the second press of two on Start', async () => {
    const { draft, wrapper } = shown([emptyLine('b1')])
    await wrapper.get('.act').trigger('click')
    await wrapper.setProps({ rows: wrapper.props('rows').map((row) => ({ ...row, state: 'going' as const })) })
    await wrapper.get('.act').trigger('click', { detail: 2 })
    expect([draft.value.lines[0]?.start.time === '', draft.value.lines[0]?.end.time]).toEqual([false, ''])
    await wrapper.get('.act').trigger('click', { detail: 1 })
    expect(draft.value.lines[0]?.end.time).not.toBe('')
  })

  it('is asked for where no other waits', async () => {
    const { wrapper, press } = shown([buildLine()])
    await press('A3')
    expect(wrapper.emitted('more')).toEqual([[{ date: '2026-06-16', time: '07:36', offset: '' }]])
  })
})
