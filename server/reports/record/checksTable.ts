import { tallyChecks } from '../../../shared/checks/tallyChecks.ts'
import { RESTS, VERDICTS, type Check } from '../../../shared/contract/record.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import type { Canvas, TextStyle } from '../parts/canvas.ts'
import { drawVerdictMark } from '../parts/drawMarks.ts'
import type { Table, TableRow } from '../parts/ledgerTable.ts'
import { measureText } from '../parts/setText.ts'
import { STYLES } from '../parts/styles.ts'
import type { Span } from '../parts/wrapText.ts'
import type { ReportWords } from './reportWords.ts'

/** Checks by what they rest on, the worst first in each; equal ones keep their order. */
export function groupChecks(checks: readonly Check[]): Check[] {
  return [...checks].sort((a, b) =>
    RESTS.indexOf(a.rests) - RESTS.indexOf(b.rests) || VERDICTS.indexOf(a.verdict) - VERDICTS.indexOf(b.verdict))
}

/** What stands beside the head: stops, cautions and what is not known; never how many passed. */
export function checksTally(checks: readonly Check[], { say }: ReportWords): string {
  const { stop, caution, unknown } = tallyChecks(checks)
  return [
    stop === 0 ? say('checks.noStop') : stop === 1 ? say('checks.oneStop') : say('checks.stops', { stops: stop }),
    ...(caution === 0 ? [] : [caution === 1 ? say('checks.oneCaution') : say('checks.cautions', { cautions: caution })]),
    ...(unknown === 0 ? [] : [say('checks.unknown', { unknown })]),
  ].join('; ')
}

/** White at both sides of a cell's words, points. */
const SIDES = 9.5
/** Its words run on where no source stands beside them. */
const TEXT_COLUMN = 5

interface ChecksInput { canvas: Canvas; checks: readonly Check[]; words: ReportWords; place: { x: number; width: number } }

/** The table of checks as they stood at signing. */
export function checksTable({ canvas, checks, words, place }: ChecksInput): Table {
  const { say, language } = words
  const grouped = groupChecks(checks)
  const widest = (ids: string[], style: TextStyle): number => Math.max(...ids.map((id) => measureText(canvas, say(id), style)))
  const fitting = (texts: (string | null)[], style: TextStyle, most: number): number =>
    Math.min(most, Math.max(0, ...texts.map((text) => measureText(canvas, text ?? '', style))) + SIDES)
  const widths = {
    rests: widest(RESTS.map((rests) => `checks.rests.${rests}`), STYLES.smallBold) + 7,
    mark: 14,
    verdict: widest(VERDICTS.map((verdict) => `checks.verdict.${verdict}`), STYLES.smallSemibold) + 10,
    title: fitting(grouped.map(({ title }) => renderMessage(language, title)), STYLES.small, 92),
    figure: fitting(grouped.map(({ figure }) => figure && renderMessage(language, figure)), STYLES.smallSemibold, 76),
    source: fitting(grouped.map((check) => sourceOf(check, words)), STYLES.note, 96),
  }
  const text = place.width - Object.values(widths).reduce((sum, width) => sum + width, 0)
  const rows = grouped.map((check, index): TableRow => {
    const opensGroup = check.rests !== grouped[index - 1]?.rests
    const isSecond = !opensGroup && check.rests !== grouped[index - 2]?.rests
    return {
      opensGroup: opensGroup && index > 0,
      keepsWithNext: opensGroup && !isSecond && grouped[index + 1]?.rests === check.rests,
      mark: { column: 1, draw: ({ x, y }) => drawVerdictMark(canvas, check.verdict, { x, y: y + 0.8, size: 9 }) },
      ...(!check.source && { runsOver: { column: TEXT_COLUMN, columns: 2 } }),
      ...(!opensGroup && { continued: restsSpans(check, words) }),
      cells: cellsOf(check, { words, showsRests: opensGroup }),
    }
  })
  return {
    x: place.x, rows, leading: STYLES.small.leading, padding: 2.7, showsHeads: false,
    columns: [
      { head: say('checks.column.rests'), width: widths.rests },
      { head: '', width: widths.mark },
      { head: say('checks.column.verdict'), width: widths.verdict },
      { head: say('checks.column.title'), width: widths.title },
      { head: say('checks.column.figure'), width: widths.figure },
      { head: say('checks.column.text'), width: text },
      { head: say('checks.column.source'), width: widths.source },
    ],
  }
}

function cellsOf(check: Check, { words, showsRests }: { words: ReportWords; showsRests: boolean }): TableRow['cells'] {
  const { say, language } = words
  const { title, figure, text, source } = check
  return [
    showsRests ? restsSpans(check, words) : [],
    [],
    [{ text: say(`checks.verdict.${check.verdict}`), style: STYLES.smallSemibold }],
    [{ text: renderMessage(language, title), style: STYLES.small }],
    figure ? [{ text: renderMessage(language, figure), style: STYLES.smallSemibold }] : [],
    [{ text: renderMessage(language, text), style: STYLES.small }],
    source ? [{ text: sourceOf(check, words), style: STYLES.note }] : [],
  ]
}

function sourceOf({ source }: Check, { say, language }: ReportWords): string {
  return source ? say('checks.source', { source: renderMessage(language, source) }) : ''
}

function restsSpans({ rests }: Check, { say }: ReportWords): Span[] {
  return [{ text: say(`checks.rests.${rests}`), style: STYLES.smallBold }]
}
