import { niceScaleBar } from '../../../shared/geo/projectToPlan.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import type { Canvas, TextStyle } from './canvas.ts'
import type { PlanBox, PlanView } from './planScale.ts'
import { drawText, measureText } from './setText.ts'
import { STYLES } from './styles.ts'

const NUMBERS: TextStyle = { ...STYLES.small, leading: 10 }
/** The bar's length is looked for up to this, points. */
const BAR_ROOM = 70

/** Height of the row under the plan, points. */
export const SCALE_FOOT_HEIGHT = 22

interface ScaleFoot { view: PlanView; frame: PlanBox; words: { scale: string; north: string }; language: Language }

/** Draws scale bar, scale and north arrow under the plan. */
export function drawScaleFoot(canvas: Canvas, { view, frame, words, language }: ScaleFoot): void {
  const top = frame.y + frame.height + 2
  drawBar(canvas, { x: frame.x + 4.5, y: top, pointsPerMetre: view.pointsPerMetre, language })
  const width = measureText(canvas, words.scale, NUMBERS)
  drawText(canvas, words.scale, { x: frame.x + frame.width - 28 - width, y: top + 9 }, NUMBERS)
  drawNorth(canvas, { x: frame.x + frame.width - 15, y: top, word: words.north })
}

function drawBar(canvas: Canvas, { x, y, pointsPerMetre, language }: { x: number; y: number; pointsPerMetre: number; language: Language }): void {
  const { doc } = canvas
  const metres = niceScaleBar(BAR_ROOM / pointsPerMetre)
  const length = metres * pointsPerMetre
  doc.lineWidth(0.75).strokeColor('#000000').fillColor('#000000')
  doc.moveTo(x, y + 7.1).lineTo(x + length, y + 7.1).stroke()
  doc.rect(x, y + 3.4, length / 4, 3.75).fill()
  doc.rect(x + length / 2, y + 3.4, length / 4, 3.75).fill()
  for (const end of [x, x + length]) doc.moveTo(end, y + 2).lineTo(end, y + 8.3).stroke()
  const isLong = metres >= 2000
  const write = (share: number): string => formatNumber(isLong ? (metres * share) / 1000 : metres * share, {}, language)
  const unit = isLong ? 'km' : 'm'
  drawCentred(canvas, '0', x, y + 9)
  drawCentred(canvas, write(0.5), x + length / 2, y + 9)
  const last = write(1)
  drawText(canvas, `${last}\u00A0${unit}`, { x: x + length - measureText(canvas, last, NUMBERS) / 2, y: y + 9 }, NUMBERS)
}

function drawCentred(canvas: Canvas, text: string, x: number, y: number): void {
  drawText(canvas, text, { x: x - measureText(canvas, text, NUMBERS) / 2, y }, NUMBERS)
}

function drawNorth(canvas: Canvas, { x, y, word }: { x: number; y: number; word: string }): void {
  const { doc } = canvas
  doc.save().translate(x, y).scale(0.5)
  doc.path('M15 11 23 38 15 32.5Z').fill('#000000')
  doc.lineWidth(1.2).path('M15 11 7 38 15 32.5Z').stroke('#000000')
  doc.restore()
  const style: TextStyle = { size: 5.5, leading: 6, weight: 'bold', color: '#000000' }
  drawText(canvas, word, { x: x + 7.5 - measureText(canvas, word, style) / 2, y: y - 1 }, style)
}
