import type { Canvas, TextStyle } from '../parts/canvas.ts'
import { drawMethodMark } from '../parts/drawMarks.ts'
import type { Table } from '../parts/ledgerTable.ts'
import { STYLES } from '../parts/styles.ts'
import type { PrintedRow, RegisterReportData } from '../registerReportData.ts'
import { MARK_ROOM, REGISTER_COLUMNS, registerCells } from './registerCells.ts'
import { ROW_SETTING } from './rowHeight.ts'
import type { Say } from './say.ts'

const regular: TextStyle = { ...STYLES.small, size: ROW_SETTING.size, leading: ROW_SETTING.leading }
const bold: TextStyle = { ...regular, weight: 'bold' }
const MARK = 7.5

/** The register as a table: a row a record, withdrawn ones struck through, unsigned ones said to be so. */
export function registerTable(canvas: Canvas, { rows, language, farm }: Pick<RegisterReportData, 'rows' | 'language' | 'farm'>, say: Say): Table {
  const place = { language, zone: farm.zone }
  return {
    x: canvas.frame.left, leading: ROW_SETTING.leading, padding: ROW_SETTING.padding, showsHeads: true,
    columns: REGISTER_COLUMNS.map((column) => ({
      head: say(`column.${column.name}`), width: column.width,
      ...('isFigure' in column && { align: 'right' as const }),
      ...('opensAccount' in column && { opensAccount: true }),
      ...('hasMark' in column && { indent: MARK_ROOM }),
    })),
    rows: rows.map((row) => ({
      hasHead: true,
      isStruck: row.state === 'withdrawn',
      cells: registerCells(row, place).map((text, index) => [{ text, style: isBold(index, row) ? bold : regular }]),
      mark: { column: REGISTER_COLUMNS.findIndex((column) => 'hasMark' in column), draw: ({ x, y }) => drawMethodMark(canvas, row.method, { x, y: y + (ROW_SETTING.leading - MARK) / 2, size: MARK }) },
    })),
  }
}

/** Number and blocks are found by; a withdrawn record and a stop are said aloud. */
function isBold(index: number, { state, tally }: PrintedRow): boolean {
  const column = REGISTER_COLUMNS[index]
  return column !== undefined && ('isBold' in column || (column.name === 'checks' && (state === 'withdrawn' || tally.stop > 0)))
}
