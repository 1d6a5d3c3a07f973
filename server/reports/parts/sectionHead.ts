import { addElement, type Canvas, type Element } from './canvas.ts'
import { drawDoubleRule } from './drawRules.ts'
import { drawText, measureText } from './setText.ts'
import { STYLES } from './styles.ts'
import { drawLines, wrapText } from './wrapText.ts'

export interface SectionHead { title: string; aside?: string; x: number; y: number; width: number }

/** Height of a section's head, its double rule included, points. */
export function sectionHeadHeight(canvas: Canvas, head: SectionHead): number {
  return RULE_HEIGHT + Math.max(STYLES.head.leading, asideLines(canvas, head).length * STYLES.small.leading) + 2
}

const RULE_HEIGHT = 6

/** Draws the head of a section; words beside it stand at its right and wrap. */
export function drawSectionHead(canvas: Canvas, parent: Element, head: SectionHead): void {
  const { x, y, width } = head
  drawDoubleRule(canvas, { x, y, width }, [1.6, 0.6])
  const at = y + RULE_HEIGHT
  addElement(canvas, parent, 'H2', () => drawText(canvas, head.title, { x, y: at }, STYLES.head))
  const lines = asideLines(canvas, head)
  if (lines.length === 0) return
  const offset = (STYLES.head.leading - STYLES.small.leading) / 2 + 0.4
  addElement(canvas, parent, 'P', () =>
    drawLines(canvas, lines, { x, y: at + offset, width, leading: STYLES.small.leading, align: 'right' }))
}

function asideLines(canvas: Canvas, { title, aside, width }: SectionHead): ReturnType<typeof wrapText> {
  if (!aside) return []
  const room = width - measureText(canvas, title, STYLES.head) - 18
  return wrapText(canvas, [{ text: aside, style: STYLES.small }], room)
}
