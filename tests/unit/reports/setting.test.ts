import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { PassThrough } from 'node:stream'
import { openCanvas, type Canvas } from '../../../server/reports/parts/canvas.ts'
import { measureRun } from '../../../server/reports/parts/measureRun.ts'
import { openFonts } from '../../../server/reports/parts/openFonts.ts'
import { isRightToLeft, placeRuns } from '../../../server/reports/parts/placeRuns.ts'
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

  it.each([
    ['≥ 5', ['bold-signs', 'semibold-latin']], ['日本語のメモ', ['bold-han']], ['천혜녹즙', ['bold-hangul']], ['👩‍🌾', ['bold-emoji']],
    ['👍🏽1️⃣', ['bold-emoji']], ['عمر', ['bold-arabic']], ['שָׁלוֹם', ['bold-hebrew']],
  ])('B-59, B-60: asks the fonts of other alphabets for %s', (text, faces) => {
    const runs = splitRuns(text, 'semibold', fonts)
    expect(runs.map(({ face }) => face)).toEqual(faces)
    expect(runs.map(({ typed }) => typed).join('')).toBe(text)
    expect(runs.some(({ isBox }) => isBox)).toBe(false)
  })

  it('keeps the joiner that decides on a letter’s shape', () => {
    expect(splitRuns('می‌خواهم', 'regular', fonts)).toEqual([{ face: 'regular-arabic', text: 'می‌خواهم', typed: 'می‌خواهم', isBox: false }])
  })

  it('boxes what no face holds, with its code points, and keeps it', () => {
    expect(splitRuns('ไท', 'bold', fonts)).toEqual([
      { face: 'regular-latin', text: 'U+0E44', typed: 'ไ', isBox: true }, { face: 'regular-latin', text: 'U+0E17', typed: 'ท', isBox: true },
    ])
    expect(splitRuns('ญี่', 'bold', fonts).map(({ text }) => text)).toEqual(['U+0E0D+0E35…'])
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

describe('placeRuns', () => {
  const canvas = openTestCanvas()
  const styles = { a: STYLES.body, b: STYLES.bodyBold }
  const place = (spans: [keyof typeof styles, string][]) => {
    const fromRight = isRightToLeft(spans.map(([, text]) => text).join(''))
    return placeRuns(canvas, spans.map(([style, text]) => ({ text, style: styles[style] })), fromRight)
  }
  /** As a reader sees it, from the left. */
  const seen = (spans: [keyof typeof styles, string][]) =>
    [...place(spans)].sort((x, y) => x.left - y.left).map(({ run }) => run.text).join('')

  it.each([
    ['plain', [['a', 'Lot N-24']], 'Lot N-24'],
    // The cases of UAX #9 in small: words from the right, numbers in them from the left, signs mirrored.
    ['words', [['a', 'عمر الخطيب']], 'الخطيب عمر'],
    ['a number in them', [['a', 'عمر 12:30 صباح']], 'صباح 12:30 عمر'],
    ['brackets', [['a', 'عمر (صباح)']], '(صباح) عمر'],
    ['in a sentence', [['a', 'By עמר שלום, late']], 'By שלום עמר, late'],
    ['isolated before a number', [['a', '\u2068עמר\u2069, 12:30']], 'עמר, 12:30'],
    ['over two styles', [['b', 'שלום'], ['a', ' עמר']], 'עמר שלום'],
    ['a full stop at the end of what reads from the right', [['a', 'שלום.']], '.שלום'],
  ] as [string, [keyof typeof styles, string][], string][])('orders %s as a reader sees it', (_name, spans, expected) => {
    expect(seen(spans)).toBe(expected)
  })

  it('gives runs in the order of reading, so that who copies or hears them gets them in it', () => {
    const placed = place([['a', 'عمر (صباح) 5']])
    expect(placed.map(({ run, spoken }) => spoken ?? run.typed).join('')).toBe('عمر (صباح) 5')
    expect(placed.filter(({ isReversed }) => isReversed).map(({ run }) => run.typed)).toEqual(['عمر', 'صباح'])
  })

  it('leaves no gap and no overlap', () => {
    const [first, ...rest] = [...place([['a', 'A שלום 12 עמר ไ z']])].sort((x, y) => x.left - y.left)
    let end = first ? first.left + measureRun(canvas, first.run, first.style.size) : 0
    for (const { run, style, left } of rest) {
      expect(left).toBeCloseTo(end, 6)
      end = left + measureRun(canvas, run, style.size)
    }
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
