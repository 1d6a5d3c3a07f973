import type { Block, Boundary } from '../../../shared/contract/block.ts'
import { niceScaleBar, toPlan, type Plan } from '../../../shared/geo/projectToPlan.ts'

interface Frame { width: number; height: number }

export interface PlanDrawing {
  path: string
  /** Where the block's label stands, pixels. */
  x: number
  y: number
  neighbours: { code: string; path: string; x: number; y: number; isNamed: boolean }[]
  /** Scale bar: metres and the pixels they take. */
  barM: number
  barPx: number
}

const MARGIN_PX = 20
/** Room a neighbour's code needs to the frame, and the scale bar below it. */
const LABEL_PX = 14

/** Blocks laid on one sheet, north up, so that the first fills it; the others as far as they show. */
export function drawPlan(block: Pick<Block, 'code' | 'geometry'>, neighbours: readonly Pick<Block, 'code' | 'geometry'>[], { width, height }: Frame): PlanDrawing {
  const plan = toPlan({ geometry: block.geometry })
  const scale = Math.min((width - 2 * MARGIN_PX) / plan.widthM, (height - 2 * MARGIN_PX) / plan.heightM)
  const middleX = plan.minX + plan.widthM / 2
  const middleY = plan.minY + plan.heightM / 2
  const place = (x: number, y: number): [number, number] => [width / 2 + (x - middleX) * scale, height / 2 - (y - middleY) * scale]
  const lay = (geometry: Boundary): { path: string; x: number; y: number } => {
    const laid = toPlan({ geometry, origin: plan.origin })
    const [x, y] = place(laid.minX + laid.widthM / 2, laid.minY + laid.heightM / 2)
    return { path: pathOf(laid, place), x, y }
  }
  const barM = niceScaleBar((width * 0.4) / scale)
  return {
    ...lay(block.geometry),
    neighbours: neighbours
      .map(({ code, geometry }) => ({ code, ...lay(geometry) }))
      .filter(({ x, y }) => x > -width && x < 2 * width && y > -height && y < 2 * height)
      .map((one) => ({ ...one, isNamed: one.x > LABEL_PX && one.x < width - LABEL_PX && one.y > LABEL_PX && one.y < height - 2 * LABEL_PX })),
    barM,
    barPx: barM * scale,
  }
}

function pathOf({ rings }: Plan, place: (x: number, y: number) => [number, number]): string {
  return rings
    .map(({ points }) => `M${points.map(([x, y]) => place(x, y).map((value) => value.toFixed(1)).join(' ')).join('L')}Z`)
    .join('')
}
