import { expect, it } from 'vitest'
import { JOURNAL_KINDS } from '../../shared/journal/journalActions.ts'
import { journal as en } from '../../shared/messages/en/journal.ts'
import { journal as es } from '../../shared/messages/es/journal.ts'

// That every deed of the server has words is a matter of types: `appendJournal` takes a `JournalAction`.
it('names every kind of deed in the filter, and says each deed in words of its own', () => {
  expect([...JOURNAL_KINDS].sort()).toEqual(Object.keys(en.action).sort())
  expect([...JOURNAL_KINDS].sort()).toEqual(Object.keys(en.kind).sort())
  for (const words of [en, es]) {
    const all = Object.values(words.action).flatMap((deeds) => Object.values(deeds))
    expect(new Set(all).size).toBe(all.length)
  }
})
