import { mount, type VueWrapper } from '@vue/test-utils'
import { beforeEach, describe, expect, it } from 'vitest'
import type { RegisterRow } from '../../../../shared/contract/record.ts'
import type { RegisterSort } from '../../../../shared/contract/register.ts'
import { presentRow } from '../../../../shared/register/presentRow.ts'
import type { RegisterLine } from '../../../../shared/register/registerLine.ts'
import RegisterFoot from '../../../../src/components/register/RegisterFoot.vue'
import RegisterList from '../../../../src/components/register/RegisterList.vue'
import RegisterTable from '../../../../src/components/register/RegisterTable.vue'
import RowTally from '../../../../src/components/register/RowTally.vue'
import { i18n } from '../../../../src/plugins/i18n.ts'
import { buildRow } from './buildRow.ts'

const place = { language: 'en', units: 'metric', zone: 'America/Los_Angeles', season: 2026 } as const
const line = (overrides: Partial<RegisterRow> = {}): RegisterLine => presentRow(buildRow(overrides), place)
const global = { plugins: [i18n] }

function mountTable(lines: RegisterLine[], chosenId: string | null = null, sort: RegisterSort = '-when'): VueWrapper {
  return mount(RegisterTable, {
    global,
    props: { lines, outlines: new Map(), chosenId, sort, sums: { words: '2 signed', area: '1.25', volume: '983', mass: '' }, hrefOf: ({ id }: RegisterLine) => `/register/${id}` },
  })
}

beforeEach(() => { i18n.global.locale.value = 'en' })

describe('RegisterTable', () => {
  it('draws a withdrawn record with a line through it, says so, and leaves its number to be read', () => {
    const row = mountTable([line({ id: 'w', state: 'withdrawn', number: '2026-0127' })]).get('[data-row="w"]')
    expect(row.findAll('s').length).toBeGreaterThan(5)
    expect(row.text()).toContain('0127')
    expect(row.text()).toContain('Withdrawn')
  })

  it('names each row by its number and chooses it on a press, opens it on the second', async () => {
    const lines = [line({ id: 'a' }), line({ id: 'b', number: '2026-0141' })]
    const table = mountTable(lines, 'b')
    await table.get('[data-row="a"] a').trigger('click')
    expect(table.emitted('choose')).toEqual([[lines[0]]])
    await table.get('[data-row="b"] a').trigger('click')
    expect(table.emitted('open')).toEqual([[lines[1]]])
    expect(table.get('[data-row="b"]').attributes('aria-current')).toBe('true')
    expect(table.get('[data-row="b"] a').attributes('aria-label')).toBe('Record 0141')
  })

  it('shows the late mark and the version of an amended record', () => {
    const text = mountTable([line({ lateHours: 31, version: 2 })]).get('tbody').text()
    expect(text).toContain('31')
    expect(text).toContain('Version 2')
  })

  it('shows a dash for what is not there, never 0', () => {
    const row = mountTable([line({ id: 'x', totalL: null, sprayLPerHa: null })]).get('[data-row="x"]')
    expect(row.get('.c-volume .line-if').text()).toBe('–')
    expect(row.get('.c-rate').text()).toBe('–')
  })

  it('is put in order by its heads: downwards first, then upwards, and says which way', async () => {
    const table = mountTable([line()], null, '-when')
    const heads = table.findAll('thead th')
    expect(heads.filter((head) => head.attributes('aria-sort') !== undefined).map((head) => [head.text(), head.attributes('aria-sort')])).toEqual([['Day', 'descending']])
    for (const name of ['Record', 'Day', 'ha']) await heads.find((head) => head.text().startsWith(name))?.get('button').trigger('click')
    expect(table.emitted('sort')).toEqual([['-number'], ['when'], ['-area']])
  })

  it('says under a neighbour what a narrow page has no column for', () => {
    const row = mountTable([line({ id: 'n' })]).get('[data-row="n"]')
    expect(row.findAll('.under').map((each) => each.text().replaceAll('\u00a0', ' '))).toEqual(['05:05', 'Brew 34', '2 470 L/ha', '0.14 ha', 'Ruan Abel'])
  })

  it('ends in the totals it was given', () => {
    expect(mountTable([line()]).get('tfoot').text().replace(/\s+/g, ' ')).toContain('2 signed')
  })
})

describe('RegisterList', () => {
  it('strikes of a withdrawn record all that the table strikes, and of others nothing', () => {
    const props = { outlines: new Map(), hrefOf: () => null }
    const withdrawn = mount(RegisterList, { global, props: { ...props, lines: [line({ state: 'withdrawn', number: '2026-0127', totalKg: '12' })] } })
    const struck = withdrawn.findAll('s').map((each) => each.text().replace(/\s+/g, ' '))
    expect(struck).toEqual(['0127', 'T1, T2', 'Leaf-mould brew', '16 Jun 05:05', expect.stringMatching(/^346.* L$/), expect.stringMatching(/^12.* kg$/)])
    expect(withdrawn.text()).toContain('Ruan Abel')
    expect(mount(RegisterList, { global, props: { ...props, lines: [line()] } }).find('s').exists()).toBe(false)
  })
})

describe('RowTally', () => {
  it.each([
    [{ stop: 1, caution: 2, unknown: 1 }, 'Stop, signed'],
    [{ stop: 2, caution: 0, unknown: 0 }, '2 stops, signed'],
    [{ stop: 0, caution: 1, unknown: 3 }, 'Caution 1'],
    [{ stop: 0, caution: 0, unknown: 1 }, 'No stop; 1\u00A0not\u00A0known'],
    [{ stop: 0, caution: 0, unknown: 0 }, 'No stop'],
  ])('of %j reads %s', (tally, words) => {
    expect(mount(RowTally, { global, props: { line: { state: 'signed', tally, onDevice: false } } }).text()).toBe(words)
  })

  it('never speaks of passes or of checks for what is not signed', () => {
    expect(mount(RowTally, { global, props: { line: { state: 'started', onDevice: false, tally: { stop: 0, caution: 0, unknown: 0 } } } }).text()).toBe('Not signed yet')
    expect(mount(RowTally, { global, props: { line: { state: 'draft', onDevice: true, tally: null } } }).text()).toBe('On this device')
  })
})

describe('RegisterFoot', () => {
  const props = { shown: 50, found: 143, hasMore: true, reading: false, failed: false, unsigned: 1, late: 4, signed: 48, keys: true }

  it('says which rows are shown and offers more', async () => {
    const foot = mount(RegisterFoot, { global, props })
    expect(foot.text()).toContain('Rows 1 to 50 of 143; the totals are of all of them.')
    expect(foot.text()).toContain('4 of 48')
    await foot.get('button').trigger('click')
    expect(foot.emitted('more')).toHaveLength(1)
  })

  it('says when these are all, and offers nothing', () => {
    const foot = mount(RegisterFoot, { global, props: { ...props, hasMore: false } })
    expect(foot.text()).toContain('all there are')
    expect(foot.find('button').exists()).toBe(false)
  })

  it('keeps the rows and says that the next ones did not come', () => {
    const foot = mount(RegisterFoot, { global, props: { ...props, failed: true } })
    expect(foot.get('[role="alert"]').text()).toBe('The next rows did not come.')
    expect(foot.get('button').text()).toBe('Try again')
  })
})
