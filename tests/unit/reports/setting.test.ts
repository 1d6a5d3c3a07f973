import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { PassThrough } from 'node:stream'
import { openCanvas, type Canvas } from '../../../server/reports/parts/canvas.ts'
import { openFonts } from '../../../server/reports/parts/openFonts.ts'
import { splitRuns, toLetters } from '../../../server/reports/parts/splitRuns.ts'
import { STYLES } from '../../../server/reports/parts/styles.ts'
import { unpackWoff } from '../../../server/reports/parts/unpackWoff.ts'
import { wrapText } from '../../../server/reports/parts/wrapText.ts'

const fonts = openFonts()

function openTestCanvas(): Canvas {
  const canvas = openCanvas({ title: 'Test', keywords: '', subject: '', createdAt: '2026-06-16T16:15:00Z', language: 'en' }, new PassThrough())
  canvas.doc.addPage()
  return canvas
}

describe('splitRuns', () => {
  it.each([
    ['Kū', [['regular-latin', 'K'], ['regular-latin-ext', 'ū']]],
    ['ΔT', [['regular-greek', 'Δ'], ['regular-latin', 'T']]],
    ['Олена', [['regular-cyrillic', 'Олена']]],
    ['Nguyễn', [['regular-latin', 'Nguy'], ['regular-vietnamese', 'ễ'], ['regular-latin', 'n']]],
    ['1⁄2 ½ § − ’', [['regular-latin', '1⁄2 ½ § − ’']]],
    ['a\u202Fb\u2011c\td', [['regular-latin', 'a\u00A0b-c d']]],
    ['soft\u00ADhyphen', [['regular-latin', 'softhyphen']]],
  ])('sets %s in faces that hold it', (text, runs) => {
    expect(splitRuns(text, 'regular', fonts).map((run) => [run.face, run.text])).toEqual(runs)
  })

  it.each([['≥', 1], ['日本', 2], ['👩‍🌾', 1], ['عمر', 3]])('marks what no face holds and keeps it: %s', (text, marks) => {
    const runs = splitRuns(text, 'bold', fonts)
    expect(runs).toEqual([{ face: 'bold-latin', text: '\uFFFD'.repeat(marks), standsFor: text }])
  })

  it('draws only letters that its face holds, whatever is typed', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary', maxLength: 40 }), (text) => {
      for (const run of splitRuns(text, 'regular', fonts)) {
        const held = fonts.open(run.face).characterSet
        for (const letter of run.text) expect(held).toContain(letter.codePointAt(0))
      }
    }), { numRuns: 200, seed: 7 })
  })
})

describe('wrapText', () => {
  const canvas = openTestCanvas()
  const wrap = (text: string, width: number) => wrapText(canvas, [{ text, style: STYLES.body }], width)
  const wordsOf = (text: string, width: number) => wrap(text, width).map(({ spans }) => spans.map((span) => span.text).join(''))

  it('breaks at spaces, never at a firm one, and keeps line ends', () => {
    expect(wordsOf('one two', 20)).toEqual(['one ', 'two'])
    expect(wordsOf('1\u00A0844 of', 30)).toEqual(['1\u00A0844 ', 'of'])
    expect(wordsOf('one\n\ntwo\r\nthree', 200)).toEqual(['one', '', 'two', 'three'])
  })

  it('keeps a word whole over two styles', () => {
    const lines = wrapText(canvas, [{ text: 'long words A3', style: STYLES.bodyBold }, { text: ', then', style: STYLES.body }], 60)
    expect(lines.map(({ spans }) => spans.map(({ text }) => text).join(''))).toEqual(['long words ', 'A3, then'])
  })

  it('cuts a word of 4,000 letters, loses none and stays inside', () => {
    const lines = wrap('W'.repeat(4000), 300)
    expect(lines.map(({ spans }) => spans[0]?.text).join('')).toBe('W'.repeat(4000))
    for (const { width } of lines) expect(width).toBeLessThanOrEqual(300)
  })

  it('loses no letter and passes no width, whatever is typed', () => {
    fc.assert(fc.property(fc.string({ unit: 'grapheme', maxLength: 120 }), fc.integer({ min: 40, max: 300 }), (text, width) => {
      const lines = wrap(text, width)
      const bare = (words: string): string => words.replace(/[ \r\n\u2028\u2029]/g, '')
      expect(bare(lines.flatMap(({ spans }) => spans.map((span) => span.text)).join(''))).toBe(bare(text))
      for (const line of lines) expect(line.width).toBeLessThanOrEqual(width + 1)
    }), { numRuns: 150, seed: 11 })
  })

  it('takes an emoji with its joiners for one letter', () => {
    expect(toLetters('a👩‍🌾b')).toEqual(['a', '👩‍🌾', 'b'])
  })
})

describe('unpackWoff', () => {
  it('refuses what is no WOFF', () => {
    expect(() => unpackWoff(Buffer.alloc(60))).toThrow(RangeError)
    expect(() => unpackWoff(Buffer.from('wOFF'))).toThrow(RangeError)
  })
})
