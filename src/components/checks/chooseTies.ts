import { byVerdict } from '../../../shared/checks/worstFirst.ts'
import type { Verdict } from '../../../shared/contract/record.ts'

/** A thread that could be drawn: from a height on the page to a height in the checks column. */
export interface Tie {
  about: string
  verdict: Verdict
  fromX: number
  fromY: number
  toY: number
}

const MOST = 6

/** The threads to draw: worst first, one a thing, six at most, and never two that cross: the lesser is dropped. */
export function chooseTies(ties: readonly Tie[]): Tie[] {
  const chosen: Tie[] = []
  for (const tie of ties.toSorted(byVerdict)) {
    if (chosen.length === MOST) break
    const fits = chosen.every((other) => other.about !== tie.about && !cross(tie, other))
    if (fits) chosen.push(tie)
  }
  return chosen
}

function cross(one: Tie, other: Tie): boolean {
  return (one.fromY - other.fromY) * (one.toY - other.toY) <= 0
}
