import { describe, expect, it } from 'vitest'
import { countChosen, readAddress, writeAddress } from '../../../../src/composables/register/registerAddress.ts'

const block = '01980000-0000-7000-8000-000000000001'

describe('the address of the register', () => {
  it('says filter and order, and nothing of what is not chosen', () => {
    const choice = { filter: { season: 2026, block, q: 'nettle bank' }, sort: 'number' as const }
    const address = writeAddress(choice)
    expect(address).toEqual({ q: 'nettle bank', season: '2026', block, sort: 'number' })
    expect(readAddress(address)).toEqual(choice)
    expect(writeAddress({ filter: {}, sort: '-when' })).toEqual({})
  })

  it.each([
    [{ season: 'x', method: 'drench' }, { method: 'drench' }],
    [{ block: 'B1', state: 'signed' }, { state: 'signed' }],
    [{ q: '--', season: ['2025', '2026'] }, {}],
    [{ sort: 'password', cursor: 'a' }, {}],
  ])('leaves out what cannot be read: %j', (query, filter) => {
    expect(readAddress(query)).toEqual({ filter, sort: '-when' })
  })

  it('counts what is chosen', () => {
    expect(countChosen({ season: 2026, q: 'a' })).toBe(2)
    expect(countChosen({})).toBe(0)
  })
})
