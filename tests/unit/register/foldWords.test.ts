import { describe, expect, it } from 'vitest'
import { foldWords, wordsToFindBy } from '../../../shared/register/foldWords.ts'

describe('words', () => {
  it.each([
    ['Lot “NF-31”, Piña', ['lot', 'nf-31', 'pina']],
    ['Ｆｕｌｌ ﬁne Ⅳ', ['full', 'fine', 'iv']],
    ['İstanbul ŁÓDŹ ʻāina', ['istanbul', 'łodz', 'ʻaina']],
    ['-- … !', []],
  ])('are folded: %s', (text, words) => {
    expect(foldWords(text)).toEqual(words)
  })

  it('are found whole, in their parts, and as numbers without noughts', () => {
    expect(wordsToFindBy('2026-0143')).toEqual(['2026-0143', '2026', '0143', '143'])
  })
})
