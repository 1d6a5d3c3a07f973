import type { Method, RecordContent } from '../../../shared/contract/recordContent.ts'
import { firstStart } from '../../../shared/records/registerRow.ts'
import { liesAhead } from '../../../shared/time/liesAhead.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import type { FieldError } from '../../errors.ts'
import { findBasisFaults, measureOf } from './findBasisFaults.ts'
import { findPartFaults } from './findPartFaults.ts'
import type { RecordGround } from './loadRecordGround.ts'

const DAY_MS = 86_400_000
const LONGEST_LINE_MS = DAY_MS

/** What is impossible in a record, at whatever stage; nothing that is merely not written yet. */
export function findRecordFaults(content: RecordContent, ground: RecordGround, now: Date): FieldError[] {
  return [
    ...content.lines.flatMap((line, index) => [...findTimeFaults(line, `lines.${index}`, now), ...findAmountFaults(content.method, line, `lines.${index}`)]),
    ...findPartFaults(content, ground),
    ...findMethodFaults(content, now),
    ...content.components.flatMap((_, index) => findComponentFaults(content, ground, index)),
  ]
}

function findTimeFaults({ startedAt, endedAt }: RecordContent['lines'][number], path: string, now: Date): FieldError[] {
  const faults: FieldError[] = []
  for (const [name, instant] of [['startedAt', startedAt], ['endedAt', endedAt]] as const) {
    if (instant !== null && liesAhead(instant, now)) faults.push({ path: `${path}.${name}`, code: 'time.future' })
  }
  if (startedAt === null || endedAt === null) return faults
  const lengthMs = Date.parse(endedAt) - Date.parse(startedAt)
  if (lengthMs < 0) {
    faults.push({ path: `${path}.startedAt`, code: 'time.end_before_start' }, { path: `${path}.endedAt`, code: 'time.end_before_start' })
  }
  if (lengthMs > LONGEST_LINE_MS) faults.push({ path: `${path}.endedAt`, code: 'time.too_long' })
  return faults
}

/** Sprays and drenches are measured out by volume, what is spread by mass or volume. */
function findAmountFaults(method: Method, { amount }: RecordContent['lines'][number], path: string): FieldError[] {
  return amount !== null && method !== 'solid' && dimensionOf(amount.unit) !== 'volume' ? [{ path: `${path}.amount.unit`, code: 'unit.not_allowed' }] : []
}

/** What belongs to one way of applying only. A solid is worked in on its first day or after, and not in the days to come. */
function findMethodFaults(content: RecordContent, now: Date): FieldError[] {
  const { method, water, workedInOn } = content
  const isSolid = method === 'solid'
  const faults: FieldError[] = []
  if (isSolid && water !== null) faults.push({ path: 'water', code: 'water.not_for_solid' })
  if (!isSolid && workedInOn !== null) faults.push({ path: 'workedInOn', code: 'worked_in.only_solid' })
  const start = firstStart(content)
  if (workedInOn === null || !isSolid) return faults
  // A civil day is the farm's: a day either side of the instants leaves room for its zone.
  const on = Date.parse(`${workedInOn}T12:00:00Z`)
  if (start !== null && on < Date.parse(start) - DAY_MS) faults.push({ path: 'workedInOn', code: 'worked_in.before_start' })
  if (on > now.getTime() + DAY_MS) faults.push({ path: 'workedInOn', code: 'time.future' })
  return faults
}

function findComponentFaults(content: RecordContent, { materials, lots }: RecordGround, index: number): FieldError[] {
  const component = content.components[index]
  const material = materials.find(({ id }) => id === component?.materialId)
  if (!component || !material) return []
  const path = `components.${index}`
  const faults: FieldError[] = []
  const { basis, used } = component
  faults.push(...findBasisFaults(basis, material, `${path}.basis`))
  if (used !== null && measureOf(used.unit) !== material.measuredIn) faults.push({ path: `${path}.used.unit`, code: `unit.needs_${material.measuredIn}` })
  const lot = lots.find(({ id }) => id === component.lotId)
  if (lot && lot.materialId !== material.id) faults.push({ path: `${path}.lotId`, code: 'lot.other_material', params: { code: lot.code } })
  return faults
}
