import type { Method } from '../../../shared/contract/recordContent.ts'
import { addElement, drawArtifact, type Canvas, type Element, type TextStyle } from './canvas.ts'
import { drawDoubleRule } from './drawRules.ts'
import { drawMethodMark } from './drawMarks.ts'
import { FRAME, FRAME_WIDTH, type Flow } from './pageFlow.ts'
import { drawText, measureText } from './setText.ts'
import { MADDER, STYLES } from './styles.ts'

export interface StampHead {
  /** "2026-" in the light weight, "0143" in the heavy one. */
  year: string
  number: string
  /** The whole, as readers by ear hear it. */
  spoken: string
  /** "version 2", "Withdrawn"; empty where there is none. */
  version: string
  withdrawn: string
  method: { kind: Method; word: string }
  when: string
}

const HEIGHT = 46

/** Draws the number as a stamp, method and day at its right, and the double rule under both. */
export function drawStampHead(flow: Flow, parent: Element, stamp: StampHead): void {
  const { canvas, y } = flow
  const yearWidth = measureText(canvas, stamp.year, STYLES.stampYear)
  const width = yearWidth + measureText(canvas, stamp.number, STYLES.stamp)
  addElement(canvas, parent, 'H1', () => {
    drawText(canvas, stamp.year, { x: FRAME.left - 1, y }, STYLES.stampYear)
    drawText(canvas, stamp.number, { x: FRAME.left - 1 + yearWidth, y }, STYLES.stamp)
  }, { actual: stamp.spoken })
  if (stamp.withdrawn !== '') strikeThrough(canvas, { x: FRAME.left - 3, y: y + 22.7, width: width + 6 })
  drawBeside(canvas, parent, { x: FRAME.left + width + 10, y, stamp })
  drawAtRight(canvas, parent, { y, stamp })
  flow.y += HEIGHT
  flow.y += drawDoubleRule(canvas, { x: FRAME.left, y: flow.y, width: FRAME_WIDTH }, [2.2, 0.6]) + 7
}

function drawBeside(canvas: Canvas, parent: Element, { x, y, stamp }: { x: number; y: number; stamp: StampHead }): void {
  const withdrawn: TextStyle = { ...STYLES.method, color: MADDER }
  if (stamp.withdrawn !== '') {
    addElement(canvas, parent, 'P', () => drawText(canvas, stamp.withdrawn, { x, y: y + 11 }, withdrawn))
  }
  if (stamp.version !== '') addElement(canvas, parent, 'P', () => drawText(canvas, stamp.version, { x, y: y + 27 }, STYLES.body))
}

function strikeThrough(canvas: Canvas, { x, y, width }: { x: number; y: number; width: number }): void {
  drawArtifact(canvas, () => canvas.doc.lineWidth(1.5).strokeColor(MADDER).moveTo(x, y).lineTo(x + width, y).stroke())
}

function drawAtRight(canvas: Canvas, parent: Element, { y, stamp }: { y: number; stamp: StampHead }): void {
  const wordX = FRAME.right - measureText(canvas, stamp.method.word, STYLES.method)
  drawArtifact(canvas, () => drawMethodMark(canvas, stamp.method.kind, { x: wordX - 14.5, y: y + 13, size: 9.5 }))
  addElement(canvas, parent, 'P', () => drawText(canvas, stamp.method.word, { x: wordX, y: y + 10 }, STYLES.method))
  const whenX = FRAME.right - measureText(canvas, stamp.when, STYLES.body)
  addElement(canvas, parent, 'P', () => drawText(canvas, stamp.when, { x: whenX, y: y + 26 }, STYLES.body))
}
