import type { Block, Boundary } from '../../../shared/contract/block.ts'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import { toPlan, type Plan } from '../../../shared/geo/projectToPlan.ts'
import { scaleBar, type ScaleBar } from '../../../shared/geo/scaleBar.ts'
import type { UnitSystem } from '../../../shared/units/readingUnit.ts'

interface Frame { width: number; height: number }

/** Where things lie on the drawing. */
export interface PlanView {
  /** The plan's 0, 0 on the ground. */
  origin: Position
  pxPerM: number
  /** Metres of the plan as pixels. */
  place: (x: number, y: number) => [number, number]
}

export interface PlanDrawing {
  path: string
  view: PlanView
  /** Where the block's label stands, pixels. */
  x: number
  y: number
  /** Further blocks that are treated in the same work. */
  also: { code: string; path: string; x: number; y: number }[]
  /** Outlines of what was treated. */
  fills: string[]
  neighbours: { code: string; path: string; x: number; y: number; isNamed: boolean }[]
  /** The scale bar and the pixels it takes. */
  bar: ScaleBar & { px: number }
}

const MARGIN_PX = 20
/** Room a neighbour's code needs to the frame, and the scale bar below it. */
const LABEL_PX = 14

type Outlined = Pick<Block, 'code' | 'geometry'>

/** Blocks laid on one sheet, north up, so that those treated fill it; the others as far as they show. */
export function drawPlan(block: Outlined, neighbours: readonly Outlined[], { width, height }: Frame, { also = [], fills, units = 'metric' }: { also?: readonly Outlined[]; fills?: readonly Boundary[]; units?: UnitSystem } = {}): PlanDrawing {
  const plan = toPlan({ geometry: block.geometry })
  const treated = [plan, ...also.map(({ geometry }) => toPlan({ geometry, origin: plan.origin }))]
  const [minX, minY] = [Math.min(...treated.map((one) => one.minX)), Math.min(...treated.map((one) => one.minY))]
  const widthM = Math.max(...treated.map((one) => one.minX + one.widthM)) - minX
  const heightM = Math.max(...treated.map((one) => one.minY + one.heightM)) - minY
  const scale = Math.min((width - 2 * MARGIN_PX) / widthM, (height - 2 * MARGIN_PX) / heightM)
  const middleX = minX + widthM / 2
  const middleY = minY + heightM / 2
  const place = (x: number, y: number): [number, number] => [width / 2 + (x - middleX) * scale, height / 2 - (y - middleY) * scale]
  const lay = (geometry: Boundary): { path: string; x: number; y: number } => {
    const laid = toPlan({ geometry, origin: plan.origin })
    const [x, y] = place(laid.minX + laid.widthM / 2, laid.minY + laid.heightM / 2)
    return { path: pathOf(laid, place), x, y }
  }
  const bar = scaleBar((width * 0.4) / scale, units)
  return {
    ...lay(block.geometry),
    view: { origin: plan.origin, pxPerM: scale, place },
    fills: (fills ?? [block, ...also].map(({ geometry }) => geometry)).map((geometry) => lay(geometry).path),
    also: also.map(({ code, geometry }) => ({ code, ...lay(geometry) })),
    neighbours: neighbours
      .map(({ code, geometry }) => ({ code, ...lay(geometry) }))
      .filter(({ x, y }) => x > -width && x < 2 * width && y > -height && y < 2 * height)
      .map((one) => ({ ...one, isNamed: one.x > LABEL_PX && one.x < width - LABEL_PX && one.y > LABEL_PX && one.y < height - 2 * LABEL_PX })),
    bar: { ...bar, px: bar.metres * scale },
  }
}

function pathOf({ rings }: Plan, place: (x: number, y: number) => [number, number]): string {
  return rings
    .map(({ points }) => `M${points.map(([x, y]) => place(x, y).map((value) => value.toFixed(1)).join(' ')).join('L')}Z`)
    .join('')
}
