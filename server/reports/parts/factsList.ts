import { addElement, type Canvas, type Element } from './canvas.ts'
import { ensureRoom, type Flow } from './pageFlow.ts'
import { drawText } from './setText.ts'
import { STYLES } from './styles.ts'
import { drawLines, wrapText, type Line, type Span } from './wrapText.ts'

/** A name and what is known under it. */
export interface Fact { label: string; spans: readonly Span[] }
export interface FactsBox { x: number; width: number; labelWidth: number }

const LEADING = STYLES.body.leading
const GAP = 0.9

interface SetFact { fact: Fact; labels: Line[]; lines: Line[]; height: number }

/** Height of facts under one another, points. */
export function factsHeight(canvas: Canvas, facts: readonly Fact[], box: FactsBox): number {
  return facts.reduce((sum, fact) => sum + setFact(canvas, fact, box).height, 0)
}

/** Draws facts into the flow as a table without lines: names at the left, what is known at the right. */
export function drawFacts(flow: Flow, parent: Element, { facts, box }: { facts: readonly Fact[]; box: FactsBox }): void {
  const { canvas } = flow
  const body = addElement(canvas, addElement(canvas, parent, 'Table'), 'TBody')
  for (const fact of facts) {
    const set = setFact(canvas, fact, box)
    ensureRoom(flow, set.height)
    const { y } = flow
    const row = addElement(canvas, body, 'TR')
    addElement(canvas, row, 'TH', () => {
      set.labels.forEach((line, index) => {
        for (const { text } of line.spans) drawText(canvas, text, { x: box.x, y: y + index * LEADING }, STYLES.label)
      })
    }, { scope: 'Row' })
    addElement(canvas, row, 'TD', () =>
      drawLines(canvas, set.lines, { x: box.x + box.labelWidth, y, width: box.width - box.labelWidth, leading: LEADING }))
    flow.y += set.height
  }
}

function setFact(canvas: Canvas, fact: Fact, { width, labelWidth }: FactsBox): SetFact {
  const labels = wrapText(canvas, [{ text: fact.label, style: STYLES.label }], labelWidth - 6)
  const lines = wrapText(canvas, fact.spans, width - labelWidth)
  return { fact, labels, lines, height: Math.max(labels.length, lines.length) * LEADING + GAP }
}
