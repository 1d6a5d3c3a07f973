import { expect, it } from 'vitest'
import type { Command } from '../../../../src/api/commandTypes.ts'
import type { KeptCommand } from '../../../../src/stores/keptCommand.ts'
import KeptItem from '../../../../src/views/frame/KeptItem.vue'
import { i18n } from '../../../../src/plugins/i18n.ts'
import { mountWithWords } from '../mountWithWords.ts'

const job = { farmId: 'f', id: 'step.block.2', about: { name: 'A3, Nettle ferment', day: '2026-06-18' } }
const refused = 'That day has passed. Choose today, 22 June 2026, or a later day.'
const problem = { type: 'about:blank', title: 'x', status: 422, code: 'invalid', detail: refused, errors: [{ path: 'to', code: 'job.past_day', message: refused }], requestId: 'r' }
const said = (command: Command, more: Partial<KeptCommand> = {}, language: 'en' | 'es' = 'en'): string => {
  i18n.global.locale.value = language
  return mountWithWords(KeptItem, { item: { key: 'k', accountId: 'oda', command, keptAt: '2026-06-16T06:00:00Z', state: 'needsYou', problem, ...more } }).text().replace(/\s+/g, ' ')
}
const move = (to: string | null): Command => ({ ...job, kind: 'job.move', body: { revision: 0, to } })

it('names the job of a refused move, the day it stood on and the one that was wanted, why it was refused, and how to go on', () => {
  const words = said(move('2026-06-20'))
  for (const part of ['Moved job, A3, Nettle ferment', 'From 18 June 2026 to 20 June 2026', refused, 'Choose a day for it again on the season sheet', 'Open the season sheet']) expect(words).toContain(part)
  expect(words.split(refused)).toHaveLength(2)
  expect(said(move(null))).toContain('Back to the day it falls due')
  for (const part of ['Del 18 de junio de 2026 al 20 de junio de 2026', 'Abrir la hoja de campaña']) expect(said(move('2026-06-20'), {}, 'es')).toContain(part)
})

it('says the day of a move that a build before this one kept, and nothing of how to go on while it only waits', () => {
  const { about: _gone, ...older } = move('2026-06-20')
  const words = said(older, { state: 'kept', problem: null })
  expect(words).toContain('Moved job')
  expect(words).toContain('To 20 June 2026')
  expect(words).not.toContain('season sheet')
})

it('says why a job was skipped, and leaves what is no job as it was', () => {
  expect(said({ ...job, kind: 'job.skip', body: { revision: 0, reason: 'Picking all week' } })).toContain('Reason: Picking all week')
  const sprayer = said({ kind: 'sprayer.create', farmId: 'f', id: 's', body: { id: 's', code: 'T1', name: 'Tank', tankL: '15' } })
  expect(sprayer).toContain('New sprayer, T1')
  expect(sprayer).not.toContain('season sheet')
})
