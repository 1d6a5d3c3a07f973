import type { Check } from '../contract/record.ts'
import { civilDateIn, civilTimeIn } from '../time/civilDate.ts'
import { buildCheck, words } from './buildCheck.ts'
import { enterAgainAt, pickAgainOn, preHarvestHold, reEntryHold } from './labelHolds.ts'
import { labelSource } from './labelSource.ts'
import type { FactMaterial, RecordFacts } from './recordFacts.ts'
import { roundForReader } from './roundForReader.ts'

/** When the last of the block lines ended; null while one of them has no end. */
function lastEnd({ content }: RecordFacts): string | null {
  const ends = content.lines.map((line) => line.endedAt)
  if (ends.length === 0 || ends.includes(null)) return null
  return ends.reduce((late, end) => (end !== null && late !== null && Date.parse(end) > Date.parse(late) ? end : late), ends[0] ?? null)
}

const codesOf = ({ content, blocks }: RecordFacts): string =>
  content.lines.map((line) => blocks.find((block) => block.id === line.blockId)?.code).filter((code) => code !== undefined).join(', ')

/**
 * How long nobody may enter: the longest re-entry interval on a label in the mix, from the end of the last block line.
 * No label, no hold: an input with no interval has none by default.
 */
export function judgeReEntry(facts: RecordFacts, materials: readonly FactMaterial[]): Check | null {
  const hold = reEntryHold(materials)
  if (hold === null) return null
  const hours = roundForReader(hold.length)
  const base = {
    code: 'label.reEntry', verdict: 'caution', rests: 'label', source: labelSource(hold.material), about: 'line:0',
    title: words('checks.reEntry.title', { hours }),
  } as const
  const endedAt = lastEnd(facts)
  if (endedAt === null) return buildCheck({ ...base, text: words('checks.reEntry.fromEnd', { hours, material: hold.material.name }) })
  const until = enterAgainAt(endedAt, hold.length)
  const when = { untilOn: civilDateIn(facts.zone, until), untilTime: civilTimeIn(facts.zone, until) }
  return buildCheck({
    ...base,
    text: words('checks.reEntry.until', { ...when, blocks: codesOf(facts) }),
    figure: words('checks.figure.time', { time: when.untilTime }),
  })
}

/** How long nothing may be picked: the longest pre-harvest interval, whole days after the civil day the work ended. */
export function judgePreHarvest(facts: RecordFacts, materials: readonly FactMaterial[]): Check | null {
  const hold = preHarvestHold(materials)
  if (hold === null) return null
  const days = Number(hold.length)
  const base = {
    code: 'label.preHarvest', verdict: 'caution', rests: 'label', source: labelSource(hold.material), about: 'line:0',
    title: words('checks.preHarvest.title', { days }),
  } as const
  const endedAt = lastEnd(facts)
  if (endedAt === null) return buildCheck({ ...base, text: words('checks.preHarvest.fromEnd', { days, material: hold.material.name }) })
  const pickOn = pickAgainOn(endedAt, hold.length, facts.zone)
  return buildCheck({
    ...base,
    text: words('checks.preHarvest.before', { pickOn, blocks: codesOf(facts) }),
    figure: words('checks.figure.date', { dayOn: pickOn }),
  })
}
