import { expect, it } from 'vitest'
import DoneToday from '../../../../src/components/today/DoneToday.vue'
import { presentRow } from '../../../../shared/register/presentRow.ts'
import { i18n } from '../../../../src/plugins/i18n.ts'
import { buildRow } from '../register/buildRow.ts'
import { mountWithWords } from '../mountWithWords.ts'

it('says of what was signed today, and is work of another day, of which', () => {
  i18n.global.locale.value = 'en'
  const line = presentRow(buildRow(), { language: 'en', units: 'metric', zone: 'America/Los_Angeles', season: 2026 })
  const list = mountWithWords(DoneToday, { lines: [{ line, signedAt: '06:05', workOf: '' }, { line: { ...line, id: 'other' }, signedAt: '05:00', workOf: '12 Jun' }], hrefOf: () => '/' })
  const [today, earlier] = list.findAll('li').map((row) => row.text().replace(/\s+/g, ' '))
  expect(today).not.toContain('work of')
  expect(earlier).toContain('by Ruan Abel work of 12 Jun')
})
