import type { PrintedRow } from '../registerReportData.ts'
import { MARK_ROOM, REGISTER_COLUMNS, registerCells, type PrintPlace } from './registerCells.ts'

/** Setting of the printed register, points. */
export const ROW_SETTING = { size: 7.5, leading: 9.5, padding: 2.4, side: 4.5 }

/** No letter of the fonts is wider than this part of its size: first kind that fits. */
const WIDEST: readonly [RegExp, number][] = [
  [/[\u00a0 .,:;'’|!ijl]/u, 0.36],
  [/[0-9]/u, 0.58],
  [/[mwMWOQGDNHU@%&+=<>~—–…]/u, 1.02],
  [/[a-z()\-/[\]"“”?*]/u, 0.66],
  [/[\u0020-\u024f\u0370-\u052f\u1e00-\u1fff]/u, 1.02],
]
const ANY_OTHER = 1.6

/** At least as high as the row is drawn, points, without opening a font: what decides how many records a volume holds. */
export function rowHeightBound(row: PrintedRow, place: PrintPlace): number {
  const lines = registerCells(row, place).map((text, index) => linesBound(text, innerWidth(index)))
  return Math.max(1, ...lines) * ROW_SETTING.leading + 2 * ROW_SETTING.padding
}

/** What a column leaves for words. */
function innerWidth(index: number): number {
  const column = REGISTER_COLUMNS[index]
  if (column === undefined) return 0
  const sides = index === 0 || index === REGISTER_COLUMNS.length - 1 ? 1 : 2
  return column.width - sides * ROW_SETTING.side - ('hasMark' in column ? MARK_ROOM : 0)
}

/** Lines of words set as tightly as their widest letters allow: the setting itself breaks no earlier. */
function linesBound(text: string, width: number): number {
  return text.split('\n').reduce((sum, paragraph) => {
    let lines = 1
    let at = 0
    for (const word of paragraph.match(/[^ ]+ *| +/gu) ?? []) {
      const bare = widthBound(word.trimEnd())
      if (at > 0 && at + bare > width) {
        lines += 1
        at = 0
      }
      if (bare > width) {
        // A word wider than the column is cut between letters; each line may fall short by one letter.
        lines += Math.ceil(bare / Math.max(width - ROW_SETTING.size * ANY_OTHER, ROW_SETTING.size)) - 1
        at = width
      } else {
        at += widthBound(word)
      }
    }
    return sum + lines
  }, 0)
}

/** At least the width of words on one line, points. */
export function widthBound(text: string): number {
  let width = 0
  for (const letter of text) width += (WIDEST.find(([kind]) => kind.test(letter))?.[1] ?? ANY_OTHER) * ROW_SETTING.size
  return width
}
