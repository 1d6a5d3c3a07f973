import type { Plan } from '../../../shared/geo/projectToPlan.ts'

/** Paper metres in a point. */
const METRES_PER_POINT = 0.0254 / 72

export interface PlanBox { x: number; y: number; width: number; height: number }
export interface PlanView {
  /** N of "1 : N", whole. */
  denominator: number
  /** Points on paper for a metre on the ground. */
  pointsPerMetre: number
  /** A place of the plan, metres east and north, as points of the page. */
  toPage(point: readonly [number, number]): [number, number]
}

/**
 * The largest scale with a whole number at which a plan stands in a box, white around it.
 * @param plan metres. @param box points. @param white share of the box's side left free at each side.
 */
export function fitPlan(plan: Pick<Plan, 'minX' | 'minY' | 'widthM' | 'heightM'>, box: PlanBox, white = 0.1): PlanView {
  const room = 1 - 2 * white
  const metresPerPoint = Math.max(plan.widthM / (box.width * room), plan.heightM / (box.height * room))
  const denominator = Math.max(1, Math.ceil(metresPerPoint / METRES_PER_POINT))
  const pointsPerMetre = 1 / (denominator * METRES_PER_POINT)
  const middle: [number, number] = [plan.minX + plan.widthM / 2, plan.minY + plan.heightM / 2]
  return {
    denominator,
    pointsPerMetre,
    toPage: ([east, north]) => [
      box.x + box.width / 2 + (east - middle[0]) * pointsPerMetre,
      box.y + box.height / 2 - (north - middle[1]) * pointsPerMetre,
    ],
  }
}
