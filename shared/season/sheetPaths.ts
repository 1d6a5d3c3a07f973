import type { Method } from '../contract/recordContent.ts'
import { toDayNumber } from '../time/dayNumber.ts'

/** Pixels of a day across and of a row down. */
export interface SheetScale { day: number; row: number }

/** Some days of the sheet, drawn at once: the first, and how many. */
export interface SheetStretch { from: string; days: number }

/** What the sheet draws, each on the row of its block, counted from 0. */
export interface SheetMarks {
  works: readonly { row: number; on: string; method: Method; heldTo: string | null }[]
  jobs: readonly { row: number; method: Method; state: 'planned' | 'due' | 'late' | 'done' | 'skipped'; earliestOn: string; latestOn: string; plannedOn: string; isKept?: boolean }[]
  harvests: readonly { row: number; from: string; to: string }[]
}

type Shape = 'foliar' | 'drench' | 'solid'
/** One path for all marks of a kind: a stretch is a dozen elements, however much is on it. */
export type SheetPaths = Record<'hold' | 'harvest' | 'planned' | 'due' | 'late' | 'skipped' | 'kept' | Shape | `${Shape}Planned`, string>

const SHAPES: Record<Method, Shape> = { foliar: 'foliar', drench: 'drench', injected: 'drench', solid: 'solid' }
/** Wide enough for marks of full size. */
const FULL_DAY = 16

/** The paths of a stretch, its upper left corner at 0,0. Spans that run beyond it are drawn whole, to be cut by its edge. */
export function sheetPaths(marks: SheetMarks, { from, days }: SheetStretch, scale: SheetScale): SheetPaths {
  const paths: SheetPaths = {
    hold: '', harvest: '', planned: '', due: '', late: '', skipped: '', kept: '', foliar: '', drench: '', solid: '', foliarPlanned: '', drenchPlanned: '', solidPlanned: '',
  }
  const first = toDayNumber(from)
  const x = (day: string): number => (toDayNumber(day) - first) * scale.day
  const meets = (start: string, end: string): boolean => x(end) + scale.day > 0 && x(start) < days * scale.day
  const cells = new Map<string, { row: number; on: string; shapes: [Shape, boolean][] }>()
  const put = (row: number, on: string, shape: Shape, isPlanned: boolean): void => {
    if (!meets(on, on)) return
    const key = `${row} ${on}`
    const cell = cells.get(key) ?? { row, on, shapes: [] }
    cell.shapes.push([shape, isPlanned])
    cells.set(key, cell)
  }
  for (const { row, on, method, heldTo } of marks.works) {
    put(row, on, SHAPES[method], false)
    if (heldTo !== null && meets(on, heldTo)) paths.hold += box(x(on), x(heldTo) + scale.day, (row + 1) * scale.row - 7, 5)
  }
  for (const { row, method, state, earliestOn, latestOn, plannedOn, isKept } of marks.jobs) {
    if (state === 'done') continue
    if (meets(earliestOn, latestOn)) paths[state] += trough(x(earliestOn) + 1, x(latestOn) + scale.day - 1, row * scale.row, scale.row, state)
    if (isKept && meets(plannedOn, plannedOn)) paths.kept += box(x(plannedOn) + 1.5, x(plannedOn) + scale.day - 1.5, row * scale.row + 3, scale.row - 6)
    if (state !== 'skipped') put(row, plannedOn, SHAPES[method], true)
  }
  for (const { row, from: start, to } of marks.harvests) {
    if (meets(start, to)) paths.harvest += `M${x(start) + 1} ${row * scale.row + 7}v-4H${x(to) + scale.day - 1}v4`
  }
  for (const { row, on, shapes } of cells.values()) {
    const radius = scale.day >= FULL_DAY ? 5.4 : 3
    shapes.forEach(([shape, isPlanned], index) => {
      const middle = x(on) + scale.day / 2 + (index - (shapes.length - 1) / 2) * radius
      const layer = isPlanned ? (`${shape}Planned` as const) : shape
      paths[layer] += mark(shape, middle, (row + 0.5) * scale.row, isPlanned ? radius - 0.8 : radius)
    })
  }
  return paths
}

const box = (left: number, right: number, top: number, height: number): string => `M${left} ${top}H${right}v${height}H${left}Z`

function trough(left: number, right: number, top: number, height: number, state: 'planned' | 'due' | 'late' | 'skipped'): string {
  const [up, down] = [top + 6, top + height - 4]
  const sides = `M${left} ${up}V${down}H${right}V${up}`
  if (state === 'late') return `${sides}M${left} ${down - 3}H${right}`
  return state === 'skipped' ? `${sides}M${left} ${down}L${right} ${up}` : sides
}

function mark(shape: Shape, x: number, y: number, r: number): string {
  const at = (value: number): string => String(Number(value.toFixed(1)))
  if (shape === 'foliar') return `M${at(x - r)} ${y}a${r} ${r} 0 1 0 ${2 * r} 0a${r} ${r} 0 1 0 ${-2 * r} 0`
  if (shape === 'solid') return `M${at(x - r)} ${at(y + r * 0.8)}h${2 * r}L${at(x)} ${at(y - r)}Z`
  return `M${at(x)} ${at(y - r * 1.15)}C${at(x + r * 0.35)} ${at(y - r * 0.5)} ${at(x + r * 0.85)} ${at(y - r * 0.1)} ${at(x + r * 0.85)} ${at(y + r * 0.35)}`
    + `A${at(r * 0.85)} ${at(r * 0.75)} 0 0 1 ${at(x - r * 0.85)} ${at(y + r * 0.35)}C${at(x - r * 0.85)} ${at(y - r * 0.1)} ${at(x - r * 0.35)} ${at(y - r * 0.5)} ${at(x)} ${at(y - r * 1.15)}Z`
}
