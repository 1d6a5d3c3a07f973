import type { FarmMapData } from '../farmMapReportData.ts'
import type { Canvas, TextStyle } from '../parts/canvas.ts'
import type { PlanBox } from '../parts/planScale.ts'
import { drawText, measureText } from '../parts/setText.ts'
import { STYLES } from '../parts/styles.ts'
import type { Say } from '../register/say.ts'
import { BUILDING, GROUND_STROKES, HEDGE } from '../parts/drawGround.ts'

const WORDS: TextStyle = { ...STYLES.small, leading: 10 }
const SIGN = 16
const GAP = 4
const BETWEEN = 9
/** Clear of the scale bar, which starts at the left. */
const FROM = 106
/** Clear of the scale and the arrow at the right. */
const UNTIL = 122

type SignName = 'keepClear' | 'water' | 'track' | 'hedge' | 'building'

/** Names the signs that the map uses, in the row under it. */
export function drawMapKey(canvas: Canvas, { data, frame, say }: { data: FarmMapData; frame: PlanBox; say: Say }): void {
  const y = frame.y + frame.height + 8
  let x = frame.x + FROM
  for (const name of signsOf(data)) {
    const word = say(`key.${name}`)
    const width = SIGN + GAP + measureText(canvas, word, WORDS)
    if (x + width > frame.x + frame.width - UNTIL) return
    drawSign(canvas, name, x, y + 5)
    drawText(canvas, word, { x: x + SIGN + GAP, y }, WORDS)
    x += width + BETWEEN
  }
}

function signsOf({ ground, sites }: FarmMapData): SignName[] {
  const has = (kind: string): boolean => ground.some((piece) => piece.kind === kind)
  const signs: [SignName, boolean][] = [
    ['keepClear', sites.some(({ keepClearM }) => keepClearM !== null)],
    ['water', has('water')], ['track', has('track')], ['hedge', has('hedge')], ['building', has('building')],
  ]
  return signs.flatMap(([name, isThere]) => (isThere ? [name] : []))
}

function drawSign({ doc }: Canvas, name: SignName, x: number, y: number): void {
  if (name === 'building') doc.rect(x + 5, y - 3, SIGN - 10, 6).fill(BUILDING)
  else if (name === 'keepClear') doc.lineWidth(0.8).dash(3.2, { space: 2.2 }).moveTo(x, y).lineTo(x + SIGN, y).stroke('#000000').undash()
  else if (name === 'hedge') doc.lineWidth(1.7).lineCap('round').dash(0.1, { space: 3.4 }).moveTo(x + 1, y).lineTo(x + SIGN, y).stroke(HEDGE).undash().lineCap('butt')
  else for (const { least, over, color } of GROUND_STROKES[name]) doc.lineWidth(least + over + 1).moveTo(x, y).lineTo(x + SIGN, y).stroke(color)
}
