import { mount } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import { dayLine } from '../../../../shared/today/dayLine.ts'
import DayLine from '../../../../src/components/today/DayLine.vue'
import { i18n } from '../../../../src/plugins/i18n.ts'

const facts = { started: ['V2'], startedByOthers: [], lateJobs: [], dueJobs: 0, keepOut: [], drafts: 1, signedToday: 3, pastLots: ['27', '28'], soonLots: [] }
const textIn = (language: 'en' | 'es', changed = {}): string => {
  i18n.global.locale.value = language
  return mount(DayLine, { global: { plugins: [i18n] }, props: { sentences: dayLine({ ...facts, ...changed }) } }).text().replace(/\s+/g, ' ')
}

describe('DayLine', () => {
  it('reads as sentences, one and many apart', () => {
    expect(textIn('en')).toBe('V2: started and not signed. 2 lots are past their use. 1 draft waits on this device. 3 records signed today.')
    expect(textIn('en', { lateJobs: [], dueJobs: 0, drafts: 2, signedToday: 1, pastLots: [] })).toBe('V2: started and not signed. 2 drafts wait on this device. 1 record signed today.')
  })

  it('reads as sentences in Spanish', () => {
    expect(textIn('es')).toBe('V2: empezado y sin firmar. 2 lotes están pasados de fecha. 1 borrador espera en este dispositivo. 3 registros firmados hoy.')
  })

  it('sets the figures in their ink', () => {
    i18n.global.locale.value = 'en'
    const line = mount(DayLine, { global: { plugins: [i18n] }, props: { sentences: dayLine(facts) } })
    expect(line.findAll('b').map((each) => [each.text(), each.classes()[0]])).toEqual([['V2', 'wel'], ['2', 'mad'], ['1', 'pen'], ['3', 'eld']])
  })
})
