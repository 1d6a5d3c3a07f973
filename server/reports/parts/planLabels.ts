import { findLineLabel } from '../../../shared/geo/findLineLabel.ts'
import type { Canvas, TextStyle } from './canvas.ts'
import { findLabelPlace, type Stretch } from './labelPlace.ts'
import { toPageLines, toPageRings } from './planShapes.ts'
import type { BlockPlan, Drawing, PlanBlock, PlanSite } from './planTypes.ts'
import { drawText, measureText } from './setText.ts'
import { ELDER, STYLES } from './styles.ts'

const CODE: TextStyle = { size: 12, leading: 14, weight: 'bold', color: ELDER }
const SMALL_CODES = [{ ...CODE, size: 8.5, leading: 10 }, { ...CODE, size: 6.5, leading: 7.5 }, { ...CODE, size: 5, leading: 6 }] as const
export const NAME: TextStyle = { size: 7.5, leading: 9, weight: 'italic', color: '#000000' }
const NEIGHBOUR: TextStyle = { size: 7.5, leading: 9, weight: 'regular', color: '#555555' }

/** Names what lies around the blocks, where there is room. */
export function nameSurroundings(drawing: Drawing, { neighbours, sites }: Pick<BlockPlan, 'neighbours' | 'sites'>): void {
  const { canvas, frame } = drawing
  for (const { code, geometry } of neighbours) {
    const place = findLabelPlace(toPageRings(geometry, drawing), frame, NEIGHBOUR.leading)
    if (place && measureText(canvas, code, NEIGHBOUR) + 4 < place.width) writeAt(canvas, place, [{ text: code, style: NEIGHBOUR }])
  }
  const written = new Set<string>()
  for (const { name, geometry } of sites) {
    // A lane in several pieces is named once.
    if (!written.has(name) && writeSiteName(drawing, name, geometry)) written.add(name)
  }
}

/** @returns whether there was room for the name. */
function writeSiteName(drawing: Drawing, name: string, geometry: PlanSite['geometry']): boolean {
  const { canvas, frame } = drawing
  const lines = toPageLines(geometry, drawing)
  const width = measureText(canvas, name, NAME)
  if (geometry.type === 'Point') {
    const [x, y] = lines[0]?.[0] ?? [0, 0]
    const isAtEdge = x + width + 8 > frame.x + frame.width
    writeAt(canvas, { x: isAtEdge ? x - 5 - width / 2 : x + 5 + width / 2, y, width }, [{ text: name, style: NAME }])
    return true
  }
  if (geometry.type === 'Polygon' || geometry.type === 'MultiPolygon') {
    const place = findLabelPlace(lines, frame, NAME.leading)
    if (!place || place.width <= width) return false
    writeAt(canvas, place, [{ text: name, style: NAME }])
    return true
  }
  const place = findLineLabel(lines, frame, width)
  if (!place) return false
  canvas.doc.save().translate(place.x, place.y).rotate(place.turn)
  writeAt(canvas, { x: 0, y: 0, width }, [{ text: name, style: NAME }])
  canvas.doc.restore()
  return true
}

/**
 * Code and notes inside the block where there is room, beside what is hatched of it if they can, else the code in the largest size that
 * fits; a lone one beside the block.
 * @returns whether there was room for any of it.
 */
export function writeBlock({ canvas, frame, ...place }: Drawing, { code, notes, geometry, treated }: PlanBlock, { isAlone }: { isAlone: boolean }): boolean {
  const rings = toPageRings(geometry, place)
  const parts = treated === 'whole' ? [] : treated.flatMap((part) => toPageRings(part, place))
  const full: Label = [{ text: code, style: CODE }, ...notes.map((text) => ({ text, style: STYLES.small }))]
  const labels: Label[] = [full, full.slice(0, 2), ...SMALL_CODES.map((style) => [{ text: code, style }])]
  for (const label of labels) {
    const height = label.reduce((sum, { style }) => sum + style.leading, 0)
    const width = Math.max(...label.map(({ text, style }) => measureText(canvas, text, style)))
    for (const ground of parts.length > 0 ? [[...rings, ...parts], rings] : [rings]) {
      const room = findLabelPlace(ground, frame, height)
      if (room && room.width > width + 3) {
        writeAt(canvas, room, label)
        return true
      }
    }
  }
  // Beside one of several it might stand in another's ground; the table names them all.
  if (!isAlone) return false
  const style = SMALL_CODES[0]
  const right = Math.max(...rings.flat().map(([x]) => x))
  const ys = rings.flat().map(([, y]) => y)
  const y = (Math.min(...ys) + Math.max(...ys)) / 2
  writeAt(canvas, { x: right + 4 + measureText(canvas, code, style) / 2, y, width: 0 }, [{ text: code, style }])
  return true
}

type Label = readonly { text: string; style: TextStyle }[]

/** Words centred on a white ground. */
export function writeAt(canvas: Canvas, { x, y }: Stretch, lines: Label): void {
  const widths = lines.map(({ text, style }) => measureText(canvas, text, style))
  const height = lines.reduce((sum, { style }) => sum + style.leading, 0)
  const width = Math.max(...widths)
  canvas.doc.rect(x - width / 2 - 1.5, y - height / 2, width + 3, height).fill('#FFFFFF')
  let top = y - height / 2
  lines.forEach(({ text, style }, index) => {
    drawText(canvas, text, { x: x - (widths[index] ?? 0) / 2, y: top }, style)
    top += style.leading
  })
}
