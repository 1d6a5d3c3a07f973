import { addElement, drawArtifact, type Canvas, type Element } from './canvas.ts'
import { drawAccountLine, drawDoubleRule, drawRule } from './drawRules.ts'
import { ensureRoom, roomLeft, turnPage, type Flow } from './pageFlow.ts'
import { MADDER, RULES, STYLES } from './styles.ts'
import { drawLines, wrapText, type Line, type Span } from './wrapText.ts'

export interface Column {
  head: string
  /** Drawn in place of the words of the head, which readers by ear are still given; y is the top of its last line. */
  drawHead?: (at: { x: number; y: number }) => void
  /** Points, white at its sides included. */
  width: number
  align?: 'left' | 'right'
  /** The columns of an account begin here, behind a double line. */
  opensAccount?: boolean
  /** Points left free before the words of a row, for its mark. */
  indent?: number
}
export interface TableRow {
  cells: readonly (readonly Span[])[]
  /** A sum: a firm line over it, a double one under it. */
  isTotal?: boolean
  /** The first cell is the head of the row. */
  hasHead?: boolean
  /** A cell whose words may run over so many columns, its own counted; the cells under them are empty. */
  runsOver?: { column: number; columns: number }
  /** A line through every word of the row: taken back, and still to be read. */
  isStruck?: boolean
  /** A firm line over the row. */
  opensGroup?: boolean
  /** Stands on the same page as the row after it. */
  keepsWithNext?: boolean
  /** Words that stand again in the first cell where a page begins with this row, in the middle of a group. */
  continued?: readonly Span[]
  /** Drawn over the cell at this column by readers by eye alone. */
  mark?: { column: number; draw: (at: { x: number; y: number }) => void }
}
export interface Table {
  x: number
  columns: readonly Column[]
  rows: readonly TableRow[]
  leading: number
  padding: number
  /** Whether column heads are drawn; they are in the structure in any case. */
  showsHeads: boolean
}

const SIDE = 4.5
const HEAD_PADDING = { top: 3, bottom: 2.5 }

interface SetRow { row: TableRow; cells: Line[][]; height: number }

/** Draws a table into the flow: rows never split, heads are drawn again on every page. */
export function drawLedgerTable(flow: Flow, parent: Element, table: Table): void {
  const { canvas } = flow
  const rows = table.rows.map((row) => setRow(canvas, table, row))
  const heads = setHeads(canvas, table)
  const element = addElement(canvas, parent, 'Table')
  ensureRoom(flow, headHeight(table, heads) + keptHeight(rows, 0))
  flow.y += drawHeads(flow, table, { heads, head: addElement(canvas, element, 'THead') })
  const body = addElement(canvas, element, 'TBody')
  rows.forEach((set, index) => {
    const isKept = rows[index - 1]?.row.keepsWithNext === true
    if (!isKept && keptHeight(rows, index) > roomLeft(flow) && index > 0) {
      turnPage(flow)
      flow.y += drawHeads(flow, table, { heads, head: null })
      drawContinued(flow, table, set.row)
    }
    drawRow(flow, table, { set, parent: body })
  })
}

/** Height of a table that stays on one page, points. */
export function ledgerTableHeight(canvas: Canvas, table: Table): number {
  const rows = table.rows.map((row) => setRow(canvas, table, row))
  return rows.reduce((sum, { height }) => sum + height, headHeight(table, setHeads(canvas, table)))
}

/** Height of a row and of those that must stand with it. */
function keptHeight(rows: readonly SetRow[], from: number): number {
  let height = 0
  for (const { row, height: own } of rows.slice(from)) {
    height += own
    if (row.keepsWithNext !== true) break
  }
  return height
}

function setRow(canvas: Canvas, table: Table, row: TableRow): SetRow {
  const cells = row.cells.map((spans, index) => wrapText(canvas, spans, cellBox(table, row, index).width))
  const lines = Math.max(1, ...cells.map((cell) => cell.length))
  return { row, cells, height: lines * table.leading + 2 * table.padding + (row.isTotal ? 2.5 : 0) }
}

function setHeads(canvas: Canvas, table: Table): Line[][] {
  return table.columns.map(({ head }, index) =>
    wrapText(canvas, [{ text: head, style: STYLES.columnHead }], innerBox(table, index).width))
}

function headHeight({ showsHeads }: Table, heads: Line[][]): number {
  if (!showsHeads) return 0
  return Math.max(...heads.map((lines) => lines.length)) * STYLES.columnHead.leading + HEAD_PADDING.top + HEAD_PADDING.bottom
}

/** Where a column's words stand: no white outside the first and the last. */
function innerBox({ x, columns }: Table, index: number): { x: number; width: number } {
  const left = columns.slice(0, index).reduce((sum, { width }) => sum + width, x)
  const width = columns[index]?.width ?? 0
  const before = index === 0 ? 0 : SIDE
  const after = index === columns.length - 1 ? 0 : SIDE
  return { x: left + before, width: width - before - after }
}

function cellBox(table: Table, { runsOver }: TableRow, index: number): { x: number; width: number } {
  const indent = table.columns[index]?.indent ?? 0
  const inner = innerBox(table, index)
  const box = { x: inner.x + indent, width: inner.width - indent }
  if (index !== runsOver?.column) return box
  const last = innerBox(table, index + runsOver.columns - 1)
  return { x: box.x, width: last.x + last.width - box.x }
}

function tableWidth({ columns }: Table): number {
  return columns.reduce((sum, { width }) => sum + width, 0)
}

/** Draws column heads; without an element they are the repetition that readers by ear are spared. */
function drawHeads(flow: Flow, table: Table, { heads, head }: { heads: Line[][]; head: Element | null }): number {
  const { canvas, y } = flow
  const height = headHeight(table, heads)
  const draw = (index: number): void => {
    const own = table.columns[index]?.drawHead
    if (own) { own({ x: innerBox(table, index).x, y: y + height - HEAD_PADDING.bottom - STYLES.columnHead.leading }); return }
    const lines = heads[index] ?? []
    const top = y + height - HEAD_PADDING.bottom - lines.length * STYLES.columnHead.leading
    drawLines(canvas, lines, { ...innerBox(table, index), y: top, leading: STYLES.columnHead.leading, align: table.columns[index]?.align ?? 'left' })
  }
  const indices = table.columns.map((_column, index) => index)
  if (head) {
    const row = addElement(canvas, head, 'TR')
    for (const [index, column] of table.columns.entries()) {
      const { head: name, drawHead } = column
      addElement(canvas, row, 'TH', table.showsHeads ? () => draw(index) : undefined, {
        scope: 'Column', ...((!table.showsHeads || drawHead !== undefined) && { actual: name }),
      })
    }
  } else if (table.showsHeads) {
    drawArtifact(canvas, () => indices.forEach(draw), 'Pagination')
  }
  if (!table.showsHeads) return 0
  drawAccountLines(canvas, table, { top: y, bottom: y + height })
  drawRule(canvas, { x: table.x, y: y + height, width: tableWidth(table) }, 0.6)
  return height
}

function drawRow(flow: Flow, table: Table, { set, parent }: { set: SetRow; parent: Element }): void {
  const { canvas, y } = flow
  const { row, cells, height } = set
  const element = addElement(canvas, parent, 'TR')
  cells.forEach((lines, index) => {
    const isHead = index === 0 && row.hasHead === true
    const hasWords = lines.some(({ spans }) => spans.length > 0)
    const draw = (): void => drawLines(canvas, lines, {
      ...cellBox(table, row, index), y: y + table.padding, leading: table.leading, align: table.columns[index]?.align ?? 'left',
    })
    addElement(canvas, element, isHead ? 'TH' : 'TD', hasWords ? draw : undefined, isHead ? { scope: 'Row' } : {})
  })
  if (row.isStruck) cells.forEach((lines, index) => strikeLines(canvas, table, { lines, index, row, y }))
  const { mark } = row
  if (mark) drawArtifact(canvas, () => mark.draw({ x: innerBox(table, mark.column).x, y: y + table.padding }))
  drawAccountLines(canvas, table, { top: y, bottom: y + height - (row.isTotal ? 2.5 : 0) })
  drawRowRules(canvas, table, { row, top: y, bottom: y + height })
  flow.y += height
}

function strikeLines(canvas: Canvas, table: Table, { lines, index, row, y }: { lines: Line[]; index: number; row: TableRow; y: number }): void {
  const box = cellBox(table, row, index)
  lines.forEach(({ width }, line) => {
    if (width === 0) return
    const x = table.columns[index]?.align === 'right' ? box.x + box.width - width : box.x
    drawRule(canvas, { x: x - 1, y: y + table.padding + (line + 0.54) * table.leading, width: width + 2 }, 0.9, MADDER)
  })
}

function drawContinued({ canvas, y }: Flow, table: Table, { continued }: TableRow): void {
  if (!continued) return
  const box = innerBox(table, 0)
  const lines = wrapText(canvas, continued, box.width)
  drawArtifact(canvas, () => drawLines(canvas, lines, { ...box, y: y + table.padding, leading: table.leading }), 'Pagination')
}

function drawRowRules(canvas: Canvas, table: Table, { row, top, bottom }: { row: TableRow; top: number; bottom: number }): void {
  const stretch = { x: table.x, width: tableWidth(table) }
  if (row.opensGroup || row.isTotal) drawRule(canvas, { ...stretch, y: top }, 0.6)
  if (row.isTotal) drawDoubleRule(canvas, { ...stretch, y: bottom - 2.5 }, [0.7, 0.7])
  else drawRule(canvas, { ...stretch, y: bottom }, 0.4, RULES.hair)
}

function drawAccountLines(canvas: Canvas, { x, columns }: Table, span: { top: number; bottom: number }): void {
  let left = x
  for (const { width, opensAccount } of columns) {
    if (opensAccount) drawAccountLine(canvas, left, span)
    left += width
  }
}
