import { booleanPointInPolygon } from '@turf/turf'
import type { PagePoint } from '../parts/labelPlace.ts'
import { NAME, writeAt } from '../parts/planLabels.ts'
import { toPageLines, toPageRings } from '../parts/planShapes.ts'
import type { Drawing } from '../parts/planTypes.ts'
import { measureText } from '../parts/setText.ts'
import type { FarmMapData } from '../farmMapReportData.ts'

/** From the middle of a mark to its name. */
const GAP = 7
/** Where along a name it is asked what lies under it. */
const SHARES = [-0.5, -0.25, 0, 0.25, 0.5]

/** Writes the names of single places at the right of their marks, or left, over or under them, where they cover the fewest blocks. */
export function nameMarks(drawing: Drawing, { blocks, sites }: FarmMapData, nameOf: (site: FarmMapData['sites'][number]) => string): void {
  const { canvas, frame } = drawing
  const grounds = blocks.map(({ geometry }) => toPageRings(geometry, drawing))
  for (const site of sites) {
    if (site.geometry.type !== 'Point') continue
    const [x, y] = toPageLines(site.geometry, drawing)[0]?.[0] ?? [0, 0]
    const text = nameOf(site)
    const width = measureText(canvas, text, NAME)
    const aside = GAP + width / 2
    const spots: PagePoint[] = [[x + aside, y], [x - aside, y], [x, y - GAP - NAME.leading / 2], [x, y + GAP + NAME.leading / 2]]
    const inTheWay = ([midX, midY]: PagePoint): number => {
      const isOut = midX - width / 2 < frame.x + 2 || midX + width / 2 > frame.x + frame.width - 2 || midY < frame.y + 6 || midY > frame.y + frame.height - 6
      return (isOut ? 10 : 0) + SHARES.filter((share) => grounds.some((rings) => isOn(rings, [midX + width * share, midY]))).length
    }
    const [atX, atY] = spots.reduce((best, spot) => (inTheWay(spot) < inTheWay(best) ? spot : best))
    writeAt(canvas, { x: atX, y: atY, width }, [{ text, style: NAME }])
  }
}

function isOn(rings: readonly PagePoint[][], [x, y]: PagePoint): boolean {
  return rings.some((ring) => booleanPointInPolygon([x, y], { type: 'Polygon', coordinates: [ring.map(([cornerX, cornerY]) => [cornerX, cornerY])] }))
}
