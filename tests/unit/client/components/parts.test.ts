import { afterEach, describe, expect, it } from 'vitest'
import type { Check } from '../../../../shared/contract/record.ts'
import CheckColumn from '../../../../src/components/checks/CheckColumn.vue'
import LateMark from '../../../../src/components/marks/LateMark.vue'
import RecordNumber from '../../../../src/components/marks/RecordNumber.vue'
import SyncBadge from '../../../../src/components/marks/SyncBadge.vue'
import AppSpine from '../../../../src/components/page/AppSpine.vue'
import { mountWithWords } from '../mountWithWords.ts'

afterEach(() => { document.body.replaceChildren() })

describe('RecordNumber', () => {
  it('has no number before it is signed', () => {
    expect(mountWithWords(RecordNumber, { number: null, state: 'started' }).text()).toBe('draft')
  })
  it('parts the year from the number', () => {
    const stamp = mountWithWords(RecordNumber, { number: '2026-0143', state: 'signed' })
    expect(stamp.text()).toBe('2026-0143')
    expect(stamp.get('.y').text()).toBe('2026-')
  })
  it('says that it is withdrawn, and which version it is', () => {
    expect(mountWithWords(RecordNumber, { number: '2026-0127', state: 'withdrawn' }).text()).toContain('Withdrawn')
    expect(mountWithWords(RecordNumber, { number: '2026-0132', state: 'signed', version: 2 }).text()).toContain('version 2')
  })
})

describe('SyncBadge', () => {
  it.each([
    [{ kind: 'sent', at: '06:41', drafts: 0 }, 'All sent 06:41'],
    [{ kind: 'sent', at: null, drafts: 1 }, 'All sent, 1 draft here'],
    [{ kind: 'sent', at: null, drafts: 3 }, 'All sent, 3 drafts here'],
    [{ kind: 'sending', count: 2, of: 5 }, 'Sending 2 of 5'],
    [{ kind: 'kept', count: 5, online: false }, 'No signal, 5 kept'],
    [{ kind: 'needsYou', count: 1 }, '1 needs you'],
  ])('%o reads %o', (state, words) => {
    const badge = mountWithWords(SyncBadge, { state })
    expect(badge.get('button').text()).toBe(words)
    expect(badge.get('[role="status"]').text()).toBe(words)
  })
})

describe('LateMark', () => {
  it('is read as a sentence', () => {
    expect(mountWithWords(LateMark, { hours: 31 }).get('.visually-hidden').text()).toBe('entered 31 hours after it was done')
  })
})

describe('AppSpine', () => {
  it('marks the active place for the eye and for readers', () => {
    const places = [{ name: 'today', to: '/', words: 'Today', icon: 'today' }, { name: 'blocks', to: '/blocks', words: 'Blocks', icon: 'blocks' }]
    const spine = mountWithWords(AppSpine, { places, active: 'blocks', farmName: 'Wennick Hollow', season: 2026 })
    const on = spine.findAll('[aria-current="page"]')
    expect(on.map((each) => each.text())).toEqual(['Blocks'])
    expect(on[0]?.find('.ribbon').exists()).toBe(true)
  })
})

describe('CheckColumn', () => {
  const check = (code: string, verdict: Check['verdict'], rests: Check['rests'], source: string | null): Check => ({
    code, verdict, rests, about: code, figure: null, band: null,
    title: { id: 'frame.checks', params: {} }, text: { id: 'frame.draft', params: {} }, source: source === null ? null : { id: source, params: {} },
  })
  const checks = [check('rate', 'caution', 'house', null), check('soap', 'stop', 'label', 'frame.spine'), check('strength', 'pass', 'label', 'frame.spine')]

  it('has a head for each group and the tally of a live form, without passes', () => {
    const column = mountWithWords(CheckColumn, { checks, language: 'en', live: true })
    expect(column.findAll('h3').map((head) => head.text())).toEqual(['LabelSpine', 'House rule'])
    expect(column.get('.tally').text().replace(/\s+/g, ' ')).toBe('Stop 1Caution 1')
  })
  it('names a shared source once, in the group’s head', () => {
    const column = mountWithWords(CheckColumn, { checks, language: 'en' })
    expect(column.findAll('.src')).toHaveLength(0)
    expect(column.get('h3 small').text()).toBe('Spine')
  })
  it('speaks the words of the verdict, not its colour', () => {
    const rows = mountWithWords(CheckColumn, { checks, language: 'es' }).findAll('[role="listitem"] em')
    expect(rows.map((row) => row.text())).toEqual(['Alto', 'En regla', 'Cuidado'])
  })
})
