import { expect, it } from 'vitest'
import { heldWords } from '../../../../src/composables/block/heldWords.ts'
import { keepSame } from '../../../../src/composables/app/keepSame.ts'
import { hatchesOf } from '../../../../src/components/map/hatches.ts'
import { renderMessage } from '../../../../shared/messages/renderMessage.ts'

const said = (language: 'en' | 'es', today: string): string[] =>
  heldWords({ reEntryUntil: '2026-06-17T04:10:00Z', pickFrom: '2026-06-20' }, 'America/Cancun', today).map((words) => renderMessage(language, words))

it('names the day on which one may go in again only where it is not today’s', () => {
  expect(said('en', '2026-06-16')).toEqual(['keep out until 23:10', 'do not pick until 20 June 2026'])
  expect(said('es', '2026-06-15')[0]).toBe('no entrar hasta las 23:10 del 16 de junio de 2026')
})

it('lies over the work that it follows', () => {
  const marks = { work: new Map([['a', { foliar: true, drench: true }], ['b', { foliar: true, drench: false }]]), holds: new Map([['a', { reEntryUntil: null, pickFrom: '2026-06-20' }]]) }
  expect(['a', 'b', 'c'].map((id) => hatchesOf(id, marks))).toEqual([['drench', 'foliar', 'hold'], ['foliar'], []])
})

it('is drawn anew only where something has changed', () => {
  const before = new Map([['a', { foliar: true }]])
  expect(keepSame(before, new Map([['a', { foliar: true }]]))).toBe(before)
  for (const now of [new Map([['a', { foliar: false }]]), new Map([['b', { foliar: true }]]), new Map<string, { foliar: boolean }>()]) expect(keepSame(before, now)).toBe(now)
})
