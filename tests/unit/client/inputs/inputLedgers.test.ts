import { mount } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it } from 'vitest'
import { ref } from 'vue'
import { judgeStatus } from '../../../../shared/checks/judgeStatus.ts'
import type { Lot } from '../../../../shared/contract/input.ts'
import LotLedger from '../../../../src/components/input/LotLedger.vue'
import MaterialLedger from '../../../../src/components/input/MaterialLedger.vue'
import { useLotWords, type LotLine } from '../../../../src/composables/input/useLotWords.ts'
import { i18n } from '../../../../src/plugins/i18n.ts'
import { buildLot, buildMaterial } from './buildInputs.ts'

const pinia = createPinia()
const global = { plugins: [i18n, pinia] }

/** Lots in English words on 16 June 2026. */
function linesOf(lots: Lot[]): LotLine[] {
  let lines: LotLine[] = []
  mount({ setup() { lines = useLotWords(ref(lots), ref('2026-06-16')).value; return () => null } }, { global })
  return lines
}

beforeEach(() => {
  setActivePinia(pinia)
  i18n.global.locale.value = 'en'
})

describe('useLotWords', () => {
  it.each([
    ['2026-06-10', 'past its use, 10 June', 'mad'],
    ['2025-12-31', 'past its use, 31 December 2025', 'mad'],
    ['2026-06-16', '16 June, today is its last day', 'wel'],
    ['2026-06-17', '17 June, in 1 day', 'wel'],
    ['2026-06-26', '26 June, in 10 days', 'wel'],
    ['2026-08-30', 'use by 30 August', 'wal'],
    [null, 'no date written', 'wal'],
  ])('says of the last day %s: %s', (expiresOn, words, ink) => {
    expect(linesOf([buildLot({ expiresOn })])[0]).toMatchObject({ useBy: words, ink })
  })

  it('says what is left, of what, and where from', () => {
    const [line] = linesOf([buildLot({ origin: 'bought', source: 'Farmers Supply' })])
    expect(line).toMatchObject({ left: '45 L', quantity: '60 L', origin: 'bought, Farmers Supply' })
    expect(linesOf([buildLot({ left: { value: '0', unit: 'L' } })])[0]?.left).toBe('empty')
  })
})

describe('LotLedger', () => {
  it('offers the count to who may correct it, and to nobody else', async () => {
    const lines = linesOf([buildLot()])
    const own = mount(LotLedger, { global, props: { lines, canCount: true, chosenMaterialId: null } })
    await own.get('button').trigger('click')
    expect(own.emitted('count')).toEqual([[lines[0]?.lot.id]])
    expect(own.emitted('choose')).toBeUndefined()
    expect(mount(LotLedger, { global, props: { lines, canCount: false, chosenMaterialId: null } }).find('button').exists()).toBe(false)
  })
})

describe('MaterialLedger', () => {
  it('says that a status rests on nothing and draws it as not known', () => {
    const material = buildMaterial({ statusBasis: null })
    const lines = [{ material, check: judgeStatus(material, 'material:x'), limits: ['keep out 12 h'] }]
    const row = mount(MaterialLedger, { global, props: { lines, canReceive: false, chosenId: null } }).get('tbody tr')
    expect(row.text()).toContain('nothing written that it rests on')
    expect(row.get('b').classes()).toContain('unknown')
    expect(row.text()).toContain('keep out 12 h')
  })
})
