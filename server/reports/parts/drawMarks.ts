import type { Method } from '../../../shared/contract/recordContent.ts'
import type { Verdict } from '../../../shared/contract/record.ts'
import type { Canvas } from './canvas.ts'
import { ELDER } from './styles.ts'

export interface MarkBox { x: number; y: number; size: number }

/** The mark of a verdict: outlined, except a stop, which is solid, so that each keeps its shape on a black printer. */
export function drawVerdictMark({ doc }: Canvas, verdict: Verdict, { x, y, size }: MarkBox): void {
  doc.save().translate(x, y).scale(size / 20).lineWidth(1.8).strokeColor('#000000').fillColor('#000000')
  if (verdict === 'stop') {
    doc.rect(1.5, 1.5, 17, 17).fill()
    doc.rect(5, 8.5, 10, 3).fill('#FFFFFF')
  } else if (verdict === 'caution') {
    doc.path('M10 1 19 10 10 19 1 10Z').stroke()
    doc.lineWidth(2.2).path('M10 5.2v5.6M10 13v2.2').stroke()
  } else if (verdict === 'unknown') {
    doc.dash(3.6, { space: 2.2 }).circle(10, 10, 8.3).stroke().undash()
    doc.path('M7.4 8.2C7.4 6.6 8.5 5.8 10 5.8S12.6 6.7 12.6 8C12.6 9.8 10 9.7 10 11.6M10 13v1.9').stroke()
  } else {
    doc.path('M2 2H11.5C16 2 18 5 18 9V18H8.5C4 18 2 15 2 11Z').stroke()
    doc.lineWidth(2.2).path('M6 10.3l3 3 5.2-6').stroke()
  }
  doc.restore()
}

/** Foliar spray: a filled disc. Soil drench: an outlined drop. Injected drench: an arrow down. Solid spread: a filled heap. */
export function drawMethodMark({ doc }: Canvas, method: Method, { x, y, size }: MarkBox): void {
  doc.save().translate(x, y).scale(size / 14)
  if (method === 'foliar') doc.circle(7, 7, 6).fill(ELDER)
  else if (method === 'solid') doc.path('M0.6 12.8C2.2 6.6 4.2 2.8 7 2.8S11.8 6.6 13.4 12.8Z').fill(ELDER)
  else if (method === 'injected') doc.lineWidth(2.2).path('M7 1V12.4M3.4 8.2 7 12.6 10.6 8.2').stroke('#000000')
  else doc.lineWidth(1.5).path('M7 1C8.6 4.2 11.8 6.9 11.8 9.5A4.8 3.7 0 0 1 2.2 9.5C2.2 6.9 5.4 4.2 7 1Z').stroke('#000000')
  doc.restore()
}

/** The mark of the product: a leaf that is a page, with a drop. */
export function drawLogo({ doc }: Canvas, { x, y, size }: MarkBox): void {
  doc.save().translate(x, y).scale(size / 64)
  doc.path('M6 4H37C50 4 58 12 58 25V60H27C14 60 6 52 6 39Z').fill(ELDER)
  doc.lineWidth(4.2).path('M14 16H34M14 25H27').stroke('#FFFFFF')
  doc.path('M36 21C39.5 29 48 35.5 48 43.5A12 10 0 0 1 24 43.5C24 35.5 32.5 29 36 21Z').fill('#FFFFFF')
  doc.restore()
}
