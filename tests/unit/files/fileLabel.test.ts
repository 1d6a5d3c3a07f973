import { describe, expect, it } from 'vitest'
import { lineText } from '../../../shared/contract/text.ts'
import { fileLabel } from '../../../shared/files/fileLabel.ts'

describe('fileLabel', () => {
  it.each([
    ['leaf.jpg', 'leaf.jpg'],
    ['../../etc/passwd', 'passwd'],
    ['C:\\Users\\hq\\Pictures\\row 4.JPG', 'row 4.JPG'],
    ['Lāʻī.png', 'Lāʻī.png'],
    ['Su\u0308d.pdf', 'Süd.pdf'],
    ['a\r\nb\u0000\u202Ec.png', 'a b c.png'],
    ['👩‍🌾.png', '👩‍🌾.png'],
    ['', 'photo'],
    ['.png', 'photo'],
    [' \u200B\u200D.jpg', 'photo'],
    ['/', 'photo'],
  ])('%j becomes %j', (name, label) => {
    expect(fileLabel(name, 'photo')).toBe(label)
  })

  it('keeps the ending of a long name and cuts no character in two', () => {
    const label = fileLabel(`${'👩‍🌾'.repeat(60)}.jpeg`, 'photo')
    expect(label.length).toBeLessThanOrEqual(120)
    expect(label).toMatch(/^(?:👩‍🌾)+….jpeg$/u)
  })

  it.each(['\ud800.png', '\u2067x.png', 'a\u2028b', '=1+1', '"quoted".png', 'x'.repeat(999)])('%j is a line that the register takes', (name) => {
    expect(lineText(120).safeParse(fileLabel(name, 'paper')).success).toBe(true)
  })
})
